import 'server-only';
import { listDecisions } from '@/db/amendment-decisions';
import { listSent, type SentFilter, type StoredAmendment } from '@/db/amendments';
import { listNumbersInUse, type WorldEditions } from '@/db/editions';
import type { AccountId } from '@/lib/access/domain/actor';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import type { WaitingQuery } from './amendment-schema';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { isOpen, mayModeratorsRead } from './domain/amendment';
import type { WaitingRow } from './domain/amendment-view';
import { approvalsNeeded, firstApproval } from './domain/approval';
import { changedItems } from './domain/changed-items';
import { namePeople } from './name-people';
import { readBase } from './read-around';
import { sentFilter } from './domain/sent-filter';

/** What waits for a moderator, or what is in the state asked for; the longest ago sent first where nothing else is asked. */
export async function listWaiting(ctx: ActorCtx, query: WaitingQuery): Promise<Result<readonly WaitingRow[], AccessRefusal>> {
  const own = askSignedIn(ctx, 'amendment.judge');
  if (!own.ok) return own;
  const filter: SentFilter = sentFilter(query, ctx.now);
  const [stored, inUse] = await Promise.all([listSent(ctx.db, filter), listNumbersInUse(ctx.db)]);
  const readable = stored.filter(({ amendment }) => mayModeratorsRead(amendment));
  const nameOf = await namePeople(
    ctx.db,
    readable.map(({ amendment }) => amendment.openedBy),
  );
  const rows: WaitingRow[] = [];
  for (const one of readable) rows.push(await rowOf(ctx, one, { who: own.value.id, inUse, nameOf }));
  return ok(inOrder(rows, query.sort));
}

type Around = { readonly who: AccountId; readonly inUse: WorldEditions; readonly nameOf: (id: string) => string };

async function rowOf(ctx: ActorCtx, { amendment, document }: StoredAmendment, { who, inUse, nameOf }: Around): Promise<WaitingRow> {
  const { id, region, summary, state, authorId, openedBy, openedAt, baseNumber } = amendment;
  const base = await readBase(ctx, amendment);
  const changed = changedItems(base, document);
  const decisions = state === 'once-approved' ? await listDecisions(ctx.db, id) : [];
  return {
    id,
    region,
    name: document.name,
    summary,
    state,
    sentAt: amendment.sentAt ?? amendment.changedAt,
    items: changed.length,
    rules: changed.filter(({ item }) => item.startsWith('rules/')).length,
    needed: approvalsNeeded(base, document),
    given: firstApproval(amendment, decisions) === null ? 0 : 1,
    isOwn: authorId === who,
    openedBy: openedBy === null || !isLooking(openedAt, ctx.now) ? null : nameOf(openedBy),
    isStale: isOpen(state) && (inUse.get(region) ?? null) !== baseNumber,
  };
}

/** How long somebody counts as looking at it, as on its own page. */
const OPEN_MS = 15 * 60_000;

const isLooking = (openedAt: Date | null, now: Date): boolean => openedAt !== null && now.getTime() - openedAt.getTime() <= OPEN_MS;

/** They come in the order they were sent; sorting keeps it among equals. */
function inOrder(rows: readonly WaitingRow[], sort: WaitingQuery['sort']): readonly WaitingRow[] {
  if (sort === 'region') return rows.toSorted((a, b) => a.name.localeCompare(b.name, 'en'));
  return sort === 'size' ? rows.toSorted((a, b) => b.items - a.items) : rows;
}
