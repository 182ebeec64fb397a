import type { Knex } from 'knex';
import { z } from 'zod';
import { canonicalJson } from '@/lib/kernel/canonical-json';
import { BEGINNING, boundText, type BoundEntry, type DayBookEntry } from '@/lib/day-book/domain/entry';
import { fingerprint } from './fingerprint';
import { dayBookEndRow, dayBookRow, type DayBookEnd } from './rows/day-book-row';
import type { Trx } from './transaction';
import { wellFormed, wellFormedJson } from './well-formed';

const COLUMNS = ['number', 'at', 'actor_id', 'did', 'subject_kind', 'subject_id', 'reason', 'details', 'previous_hash', 'hash'] as const;

/**
 * Writes a line of the day book, in the transaction of what it tells. Lines are bound to each other, so acts that are written down
 * wait for each other here: call it last. Never give it names, e-mail addresses or words about a person.
 */
export async function writeDayBook(trx: Trx, entry: Omit<DayBookEntry, 'number'>): Promise<void> {
  const end = await lockEnd(trx);
  const reason = entry.reason === null ? null : wellFormed(entry.reason);
  const line = { ...entry, reason, details: wellFormedJson(entry.details), number: end.number + 1 };
  const hash = fingerprint(boundText(line, end.hash));
  await trx('day_book').insert({
    number: line.number,
    at: line.at,
    actor_id: line.actorId,
    did: line.did,
    subject_kind: line.subject.kind,
    subject_id: line.subject.id,
    reason,
    details: canonicalJson(line.details),
    previous_hash: end.hash,
    hash,
  });
  await trx('day_book_ends').where({ id: 1 }).update({ number: line.number, hash });
}

/** The row that lines up all writers. The first of them ever makes it. */
async function lockEnd(trx: Trx): Promise<DayBookEnd> {
  const found: unknown = await trx('day_book_ends').where({ id: 1 }).select('number', 'hash').forUpdate().first();
  if (found !== undefined) return dayBookEndRow.parse(found);
  await trx('day_book_ends').insert({ id: 1, number: 0, hash: BEGINNING }).onConflict('id').ignore();
  const made: unknown = await trx('day_book_ends').where({ id: 1 }).select('number', 'hash').forUpdate().first();
  return dayBookEndRow.parse(made);
}

export type DayBookFilter = {
  /** `role.grant`; any of them. Left out: all. */
  readonly did?: readonly string[];
  readonly subject?: { readonly kind: string; readonly id: string };
  readonly actorId?: string;
  /** The code of the place a line is about, as its details name it. */
  readonly region?: string;
  readonly from?: Date;
  /** The first instant that is not asked for any more. */
  readonly until?: Date;
  /** For the next page: the number of the last entry of this one. */
  readonly before?: number;
  readonly limit: number;
};

/** Entries that meet all of the filter, newest first. */
export async function listDayBook(db: Knex, filter: DayBookFilter): Promise<readonly BoundEntry[]> {
  const { did, subject, actorId, region, from, until, before, limit } = filter;
  const query = db('day_book')
    .select(...COLUMNS)
    .orderBy('number', 'desc')
    .limit(limit);
  if (did !== undefined) void query.whereIn('did', [...did]);
  if (subject !== undefined) void query.where({ subject_kind: subject.kind, subject_id: subject.id });
  if (actorId !== undefined) void query.where({ actor_id: actorId });
  if (region !== undefined) void query.whereRaw("json_value(details, '$.region') = ?", [region]);
  if (from !== undefined) void query.where('at', '>=', from);
  if (until !== undefined) void query.where('at', '<', until);
  if (before !== undefined) void query.where('number', '<', before);
  const rows: unknown = await query;
  return z.array(dayBookRow).parse(rows);
}

/** Entries in the order they were written, after a number. */
export async function listDayBookAfter(db: Knex, number: number, limit: number): Promise<readonly BoundEntry[]> {
  const rows: unknown = await db('day_book')
    .where('number', '>', number)
    .orderBy('number')
    .limit(limit)
    .select(...COLUMNS);
  return z.array(dayBookRow).parse(rows);
}

/** The number and hash that the last line has to have; null when nothing was written yet. */
export async function findDayBookEnd(db: Knex): Promise<DayBookEnd | null> {
  const row: unknown = await db('day_book_ends').where({ id: 1 }).select('number', 'hash').first();
  return row === undefined ? null : dayBookEndRow.parse(row);
}
