import 'server-only';
import { publishEdition, type NewEdition } from '@/db/editions';
import { putRegion, replaceMemberships } from '@/db/regions';
import type { Trx } from '@/db/transaction';
import { canonicalJson } from '@/lib/kernel/canonical-json';
import type { Sheet } from './domain/sheet';

export type PutInUse = NewEdition & {
  readonly number: number;
  /** What is in use until now; null for a place without a sheet. */
  readonly before: Sheet | null;
};

/** Puts a document in use with all that hangs on it: the place, its layers and the edition. The caller holds the world. */
export async function putInUse(trx: Trx, { number, before, ...edition }: PutInUse): Promise<void> {
  const { code, name, kind, memberships } = edition.sheet;
  if (before === null || before.name !== name || before.kind !== kind) await putRegion(trx, { code, name, kind });
  await publishEdition(trx, number, edition);
  const isOtherwise = before === null || canonicalJson(before.memberships) !== canonicalJson(memberships);
  if (isOtherwise) await replaceMemberships(trx, code, memberships);
}
