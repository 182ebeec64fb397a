import 'server-only';
import { listNamed } from '@/db/account-search';
import { listKeepers as findKeepers } from '@/db/keepers';
import { sayActor, type Said } from '@/lib/day-book/domain/told-line';
import type { Ctx } from '@/lib/server/ctx';

/** Somebody who keeps a sheet: editors and moderators by name, stewards by their role. */
export type Keeper = { readonly region: string; readonly accountId: string; readonly said: Said };

/** Keepers of one sheet, or of all, whoever took it on first standing first. Who is no editor any more is not among them. */
export async function listKeepers({ db }: Ctx, region?: string): Promise<readonly Keeper[]> {
  const rows = await findKeepers(db, region);
  const people = await listNamed(db, [...new Set(rows.map(({ accountId }) => accountId))]);
  const byId = new Map(people.map((person) => [String(person.id), sayActor(person)]));
  return rows.flatMap(({ region: of, accountId }) => {
    const said = byId.get(accountId);
    return said === undefined || said.kind === 'former-editor' ? [] : [{ region: of, accountId, said }];
  });
}
