import 'server-only';
import { listNamed } from '@/db/account-search';
import { countDoubts, countWaitingDoubts, findDoubt, listAnsweredDoubts, listDoubts as findDoubts } from '@/db/doubts';
import { mayNow, type AccessRefusal } from '@/lib/access/domain/policy';
import { sayActor, type Said } from '@/lib/day-book/domain/told-line';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import type { Ctx } from '@/lib/server/ctx';
import type { Doubt, DoubtState } from './domain/doubt';
import type { DoubtsQuery } from './doubt-schema';
import { listSheetsInUse } from './list-sheets-in-use';

/** A doubt with the rule it is about, as far as that still stands, and by whom it was answered or put aside. */
export type ToldDoubt = Doubt & {
  readonly place: string;
  readonly ruleTitle: string | null;
  readonly by: Said | null;
};

export type ListedDoubts = {
  readonly doubts: readonly ToldDoubt[];
  readonly state: DoubtState;
  readonly counts: ReadonlyMap<DoubtState, number>;
  /** Places one can narrow the list to. */
  readonly places: readonly { readonly code: string; readonly name: string }[];
  /** The id after which the next page begins; null on the last one. */
  readonly next: string | null;
};

const AT_A_TIME = 50;
const MOST_ANSWERED = 50;

/** Doubts for the desk: those that wait, unless another state is asked for. */
export async function listDoubts(ctx: ActorCtx, query: DoubtsQuery): Promise<Result<ListedDoubts, AccessRefusal>> {
  const may = mayNow(ctx.actor, 'doubt.answer', ctx.now);
  if (!may.ok) return may;
  const { state = 'waiting', region, after } = query;
  const [found, counts, sheets] = await Promise.all([
    findDoubts(ctx.db, { state, region, after, limit: AT_A_TIME + 1 }),
    countDoubts(ctx.db, region),
    listSheetsInUse(ctx),
  ]);
  const doubts = await tell(ctx, found.slice(0, AT_A_TIME));
  const places = sheets.map(({ sheet: { code, name } }) => ({ code, name }));
  return ok({ doubts, state, counts, places, next: found.length > AT_A_TIME ? (doubts.at(-1)?.id ?? null) : null });
}

/** One doubt for the desk, whatever became of it. */
export async function readDoubt(ctx: ActorCtx, id: string): Promise<Result<ToldDoubt, AccessRefusal | { readonly kind: 'not-found' }>> {
  const may = mayNow(ctx.actor, 'doubt.answer', ctx.now);
  if (!may.ok) return may;
  const found = await findDoubt(ctx.db, id);
  const [doubt] = found === null ? [] : await tell(ctx, [found]);
  return doubt === undefined ? err({ kind: 'not-found' }) : ok(doubt);
}

/** What everybody may read on a rule: how many doubts wait, without a word of them, and those that were answered. */
export type RuleDoubts = {
  readonly waiting: number;
  readonly answered: readonly {
    readonly id: string;
    readonly words: string;
    readonly elsewhere: string | null;
    readonly link: string | null;
    readonly answer: string;
    readonly by: Said;
    readonly on: Date;
  }[];
};

export async function readRuleDoubts(ctx: Ctx, rule: string): Promise<RuleDoubts> {
  const [waiting, found] = await Promise.all([countWaitingDoubts(ctx.db, rule), listAnsweredDoubts(ctx.db, rule, MOST_ANSWERED)]);
  const people = await peopleBehind(ctx, found);
  return {
    waiting,
    answered: found.map(({ id, words, elsewhere, link, answer, answeredBy, answeredAt, madeAt }) => ({
      id,
      words,
      elsewhere,
      link,
      answer: answer ?? '',
      by: sayActor(people.get(answeredBy ?? '')),
      on: answeredAt ?? madeAt,
    })),
  };
}

async function tell(ctx: Ctx, doubts: readonly Doubt[]): Promise<readonly ToldDoubt[]> {
  const [people, editions] = await Promise.all([peopleBehind(ctx, doubts), listSheetsInUse(ctx)]);
  const sheets = new Map(editions.map(({ region, sheet }) => [region, sheet]));
  return doubts.map((doubt) => {
    const sheet = sheets.get(doubt.region);
    return {
      ...doubt,
      place: sheet?.name ?? doubt.region,
      ruleTitle: sheet?.rules.find(({ id }) => id === doubt.rule)?.title ?? null,
      by: doubt.answeredBy === null ? null : sayActor(people.get(doubt.answeredBy)),
    };
  });
}

async function peopleBehind(
  { db }: Ctx,
  doubts: readonly Doubt[],
): Promise<ReadonlyMap<string, Awaited<ReturnType<typeof listNamed>>[number]>> {
  const people = await listNamed(db, [...new Set(doubts.flatMap(({ answeredBy }) => answeredBy ?? []))]);
  return new Map(people.map((person) => [person.id, person]));
}
