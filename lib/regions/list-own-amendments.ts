import 'server-only';
import { listAmendmentsOf } from '@/db/amendments';
import { listNumbersInUse } from '@/db/editions';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { readEdition } from '@/lib/server/sheets';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { isOpen, type Amendment } from './domain/amendment';
import { changedItems } from './domain/changed-items';

/** A line of an author's own list. */
export type OwnAmendmentRow = {
  readonly amendment: Amendment;
  /** The place's name as the amendment has it. */
  readonly name: string;
  /** Items that differ from the edition it was begun from. */
  readonly items: number;
  /** Another edition is in use by now. */
  readonly isStale: boolean;
};

/** Whoever asks sees their own amendments, the one touched last first. */
export async function listOwnAmendments(ctx: ActorCtx): Promise<Result<readonly OwnAmendmentRow[], AccessRefusal>> {
  const own = askSignedIn(ctx, 'amendment.write');
  if (!own.ok) return own;
  const [stored, inUse] = await Promise.all([listAmendmentsOf(ctx.db, own.value.id), listNumbersInUse(ctx.db)]);
  const rows: OwnAmendmentRow[] = [];
  for (const { amendment, document } of stored) {
    const { region, baseNumber, state } = amendment;
    const base = baseNumber === null ? null : await readEdition(ctx.db, region, baseNumber);
    const isStale = isOpen(state) && (inUse.get(region) ?? null) !== baseNumber;
    rows.push({ amendment, name: document.name, items: changedItems(base?.sheet ?? null, document).length, isStale });
  }
  return ok(rows);
}
