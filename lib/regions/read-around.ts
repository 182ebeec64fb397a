import 'server-only';
import { listDecisions } from '@/db/amendment-decisions';
import { listRemarks, type StoredRemark } from '@/db/amendment-remarks';
import { listOpenOn, type StoredAmendment } from '@/db/amendments';
import { findNumberInUse } from '@/db/editions';
import type { AccountId } from '@/lib/access/domain/actor';
import type { Ctx } from '@/lib/server/ctx';
import { readEdition } from '@/lib/server/sheets';
import { isOpen, type Amendment } from './domain/amendment';
import type { AlsoOpen, Remark, Stale, ToldDecision } from './domain/amendment-view';
import type { Decision } from './domain/approval';
import { changedItems, touchedByBoth } from './domain/changed-items';
import { threeWayRows } from './domain/merge-sheets';
import type { Sheet } from './domain/sheet';
import { namePeople } from './name-people';

/** The sheet in the edition an amendment was begun from; null for a place that had none. */
export async function readBase({ db }: Pick<Ctx, 'db'>, { region, baseNumber }: Amendment): Promise<Sheet | null> {
  if (baseNumber === null) return null;
  const edition = await readEdition(db, region, baseNumber);
  if (edition === null) throw new Error(`An amendment is based on edition ${String(baseNumber)} of "${region}", which is not there`);
  return edition.sheet;
}

/** What came into use since the amendment was begun, field by field; null while nothing did or it is over. */
export async function readStale(ctx: Ctx, { amendment, document }: StoredAmendment): Promise<Stale | null> {
  const { region, baseNumber, state } = amendment;
  const to = await findNumberInUse(ctx.db, region);
  if (!isOpen(state) || to === baseNumber) return null;
  const now = to === null ? null : await readEdition(ctx.db, region, to);
  const rows = now === null ? [] : threeWayRows({ base: await readBase(ctx, amendment), now: now.sheet, mine: document });
  return { from: baseNumber, to, rows };
}

/** Other amendments under way that touch the same items. Whose they are and what they say is told to nobody. */
export async function readAlsoOpen(ctx: Ctx, { amendment, document }: StoredAmendment): Promise<readonly AlsoOpen[]> {
  const mine = changedItems(await readBase(ctx, amendment), document);
  const found: AlsoOpen[] = [];
  for (const other of await listOpenOn(ctx.db, amendment.region)) {
    if (other.amendment.id === amendment.id) continue;
    const items = touchedByBoth(mine, changedItems(await readBase(ctx, other.amendment), other.document));
    const { region, state, madeAt } = other.amendment;
    if (items.length > 0) found.push({ region, state, since: madeAt, items });
  }
  return found;
}

export type Talk = {
  readonly remarks: readonly Remark[];
  readonly decisions: readonly ToldDecision[];
  readonly taken: readonly Decision[];
  readonly nameOf: (id: string) => string;
};

/** Remarks and decisions, with the names people go by today; those of `more` too. */
export async function readTalk({ db }: Ctx, { id }: Amendment, viewer: AccountId, more: readonly (string | null)[]): Promise<Talk> {
  const [remarks, taken] = await Promise.all([listRemarks(db, id), listDecisions(db, id)]);
  const nameOf = await namePeople(db, [...remarks.map(({ authorId }) => authorId), ...taken.map(({ by }) => by), ...more]);
  const decisions = taken.map((one): ToldDecision => ({ ...one, by: nameOf(one.by), isOwn: one.by === viewer }));
  return { remarks: toldRemarks(remarks, viewer, nameOf), decisions, taken, nameOf };
}

const toldRemarks = (all: readonly StoredRemark[], viewer: AccountId, nameOf: (id: string) => string): readonly Remark[] =>
  all
    .filter(({ answerTo }) => answerTo === null)
    .map(({ id, line, words, authorId, at, answeredAt }) => ({
      id,
      line,
      by: nameOf(authorId),
      isOwn: authorId === viewer,
      words,
      at,
      answers: all
        .filter(({ answerTo }) => answerTo === id)
        .map((answer) => ({ id: answer.id, by: nameOf(answer.authorId), words: answer.words, at: answer.at })),
      isAnswered: answeredAt !== null,
    }));
