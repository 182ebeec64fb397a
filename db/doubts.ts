import type { Knex } from 'knex';
import { z } from 'zod';
import type { AccountId } from '@/lib/access/domain/actor';
import type { Doubt, DoubtState } from '@/lib/regions/domain/doubt';
import { doubtCountRow, doubtRow } from './rows/doubt-row';
import type { Trx } from './transaction';
import { wellFormed } from './well-formed';

/** Never the trace: it is there to find the same words again for a day, and for nothing else. */
const COLUMNS = [
  'id',
  'region',
  'rule_id',
  'words',
  'elsewhere',
  'link',
  'state',
  'answer',
  'aside_why',
  'answered_by',
  'made_at',
  'answered_at',
] as const;

/** `trace` is 32 bytes made of the address, the rule, the words and the day: the same one a second time changes nothing. */
export type NewDoubt = Pick<Doubt, 'id' | 'region' | 'rule' | 'words' | 'elsewhere' | 'link'> & {
  readonly trace: Buffer;
  readonly at: Date;
};

const orNull = (text: string | null): string | null => (text === null ? null : wellFormed(text));

/** Puts a doubt down. The same words sent again from the same address on the same day are still one. */
export async function insertDoubt(db: Knex, { id, region, rule, words, elsewhere, link, trace, at }: NewDoubt): Promise<void> {
  await db('doubts')
    .insert({
      id,
      region,
      rule_id: rule,
      words: wellFormed(words),
      elsewhere: orNull(elsewhere),
      link: orNull(link),
      state: 'waiting',
      made_at: at,
      trace,
    })
    .onConflict('trace')
    .ignore();
}

/** Whether those words were put down from that address on that day. */
export async function hasDoubtTrace(db: Knex, trace: Buffer): Promise<boolean> {
  return (await db('doubts').where({ trace }).select('id').first()) !== undefined;
}

/** Forgets what could tell that two doubts came from one address, of some doubts made before that instant. Answers with how many. */
export async function dropDoubtTraces(db: Knex, before: Date, most: number): Promise<number> {
  return db('doubts').whereNotNull('trace').where('made_at', '<', before).limit(most).update({ trace: null });
}

export async function findDoubt(db: Knex, id: string): Promise<Doubt | null> {
  const row: unknown = await db('doubts')
    .where({ id })
    .select(...COLUMNS)
    .first();
  return row === undefined ? null : doubtRow.parse(row);
}

export type DoubtFilter = {
  readonly state: DoubtState;
  readonly region?: string | undefined;
  /** For the next page: the id of the last doubt of this one. */
  readonly after?: string | undefined;
  readonly limit: number;
};

/** Doubts in that state by their ids, which ascend with time: those that wait the oldest first, the others the newest first. */
export async function listDoubts(db: Knex, { state, region, after, limit }: DoubtFilter): Promise<readonly Doubt[]> {
  const isWaiting = state === 'waiting';
  const query = db('doubts')
    .where({ state })
    .orderBy('id', isWaiting ? 'asc' : 'desc')
    .limit(limit)
    .select(...COLUMNS);
  if (region !== undefined) void query.where({ region });
  if (after !== undefined) void query.where('id', isWaiting ? '>' : '<', after);
  const rows: unknown = await query;
  return z.array(doubtRow).parse(rows);
}

/** How many doubts are in each state, of all places or of one. */
export async function countDoubts(db: Knex, region?: string): Promise<ReadonlyMap<DoubtState, number>> {
  const query = db('doubts').groupBy('state').select('state').count({ times: '*' });
  if (region !== undefined) void query.where({ region });
  const rows: unknown = await query;
  return new Map(
    z
      .array(doubtCountRow)
      .parse(rows)
      .map(({ state, times }) => [state, times]),
  );
}

/** How many doubts about a rule wait, without a word of them. */
export async function countWaitingDoubts(db: Knex, rule: string): Promise<number> {
  const rows: unknown = await db('doubts')
    .where({ rule_id: rule, state: 'waiting' })
    .groupBy('state')
    .select('state')
    .count({ times: '*' });
  return z.array(doubtCountRow).parse(rows)[0]?.times ?? 0;
}

/** Doubts about a rule that were answered, the newest answer first. */
export async function listAnsweredDoubts(db: Knex, rule: string, limit: number): Promise<readonly Doubt[]> {
  const rows: unknown = await db('doubts')
    .where({ rule_id: rule, state: 'answered' })
    .orderBy('answered_at', 'desc')
    .limit(limit)
    .select(...COLUMNS);
  return z.array(doubtRow).parse(rows);
}

/** Doubts that an account answered or put aside, the newest first. */
export async function listAnswersBy(db: Knex, accountId: AccountId, limit: number): Promise<readonly Doubt[]> {
  const rows: unknown = await db('doubts')
    .where({ answered_by: accountId })
    .orderBy('answered_at', 'desc')
    .limit(limit)
    .select(...COLUMNS);
  return z.array(doubtRow).parse(rows);
}

export async function lockDoubt(trx: Trx, id: string): Promise<Doubt | null> {
  const row: unknown = await trx('doubts')
    .where({ id })
    .select(...COLUMNS)
    .forUpdate()
    .first();
  return row === undefined ? null : doubtRow.parse(row);
}

export type DoubtEnd =
  | { readonly state: 'answered'; readonly answer: string; readonly by: AccountId; readonly at: Date }
  | { readonly state: 'set-aside'; readonly why: string; readonly by: AccountId; readonly at: Date }
  | { readonly state: 'waiting' };

/** Moves a doubt on from the state it was read in. False when somebody else had moved it meanwhile. */
export async function moveDoubt(trx: Trx, id: string, from: DoubtState, end: DoubtEnd): Promise<boolean> {
  const changed = await trx('doubts')
    .where({ id, state: from })
    .update({
      state: end.state,
      answer: end.state === 'answered' ? wellFormed(end.answer) : null,
      aside_why: end.state === 'set-aside' ? wellFormed(end.why) : null,
      answered_by: end.state === 'waiting' ? null : end.by,
      answered_at: end.state === 'waiting' ? null : end.at,
    });
  return changed === 1;
}
