import 'server-only';
import { findAccount } from '@/db/accounts';
import { listEntries } from '@/db/amendment-entries';
import { listAmendmentsOf } from '@/db/amendments';
import { listDayBook } from '@/db/day-book';
import { listFilesOf } from '@/db/files';
import { listAnswersBy } from '@/db/doubts';
import { listKeepingsOf } from '@/db/keepers';
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
    ['files', async () => (await listFilesOf(db, id, MOST)).map(({ storeKey: _, ownerId: __, ...file }) => file)],
    ['sheets-you-keep', () => listKeepingsOf(db, id)],
    ['doubts-you-answered', () => listAnswersBy(db, id, MOST)],
    ['amendments', () => amendmentsOf(db, id)],
    ['day-book-what-you-did', () => listDayBook(db, { actorId: id, limit: MOST })],
    ['day-book-what-was-done-to-you', () => listDayBook(db, { subject: { kind: 'account', id }, limit: MOST })],
  ];
}

/** With the whole document of each, and what was typed for it and not saved. */
async function amendmentsOf(db: Ctx['db'], id: AccountId): Promise<unknown> {
  const own = await listAmendmentsOf(db, id, MOST);
  return Promise.all(own.map(async (one) => ({ ...one, entries: await listEntries(db, one.amendment.id) })));
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
