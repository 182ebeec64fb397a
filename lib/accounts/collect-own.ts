import 'server-only';
import { findAccount } from '@/db/accounts';
import { listDayBook } from '@/db/day-book';
import { listOwnRoleRequests } from '@/db/role-requests';
import { listSessions } from '@/db/sessions';
import type { AccountId } from '@/lib/access/domain/actor';
import type { Ctx } from '@/lib/server/ctx';

const MOST = 10_000;
const EVER = new Date(0);

type Part = readonly [name: string, read: () => Promise<unknown>];

/** What an archive holds. A slice that keeps something of a person's own adds a line. */
function partsOf({ db, now }: Ctx, id: AccountId): readonly Part[] {
  return [
    ['account', () => findAccount(db, id)],
    ['sessions', async () => (await listSessions(db, { accountId: id, now, idleSince: EVER }, MOST)).map(({ id: _, ...line }) => line)],
    ['requests-for-a-role', () => listOwnRoleRequests(db, id, MOST)],
    ['day-book-what-you-did', () => listDayBook(db, { actorId: id, limit: MOST })],
    ['day-book-what-was-done-to-you', () => listDayBook(db, { subject: { kind: 'account', id }, limit: MOST })],
  ];
}

/** All that is an account's own, by kind, without hashes and secrets: of those there is nothing to take along. */
export async function collectOwn(
  ctx: Ctx,
  id: AccountId,
  report: (done: number, total: number) => Promise<void>,
): Promise<Readonly<Record<string, unknown>>> {
  const parts = partsOf(ctx, id);
  const made = new Map<string, unknown>();
  for (const [name, read] of parts) {
    made.set(name, await read());
    await report(made.size, parts.length);
  }
  return Object.fromEntries(made);
}
