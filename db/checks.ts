import type { Knex } from 'knex';
import { canonicalJson } from '@/lib/kernel/canonical-json';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { CheckId } from '@/lib/checks/domain/ids';
import type { Answers } from '@/lib/checks/domain/knowledge';
import { checkRow, type Check } from './rows/check-row';
import type { Trx } from './transaction';

const COLUMNS = ['id', 'regions', 'sale_on', 'answers', 'declined', 'entry', 'from_note', 'shown', 'kept', 'touched_at'] as const;

export type NewCheck = {
  readonly id: CheckId;
  readonly regions: readonly string[];
  readonly saleOn: CalendarDate | null;
  readonly fromNote: Answers;
  readonly at: Date;
};

/** Begins a check; one that stands at this address already stays as it is, so that a form sent twice begins one check. */
export async function insertCheck(trx: Trx, { id, regions, saleOn, fromNote, at }: NewCheck): Promise<void> {
  const begun = { begun_at: at, touched_at: at, from_note: Object.keys(fromNote).length === 0 ? null : canonicalJson(fromNote) };
  const row = { id, regions: canonicalJson(regions), sale_on: saleOn, answers: '{}', declined: '[]', ...begun };
  await trx('checks').insert(row).onConflict('id').ignore();
}

/** The check, or null when there is none or it was last touched before `since` and not kept. */
export async function findCheck(db: Knex, id: CheckId, since: Date): Promise<Check | null> {
  const row: unknown = await alive(db, id, since).first();
  return row === undefined ? null : checkRow.parse(row);
}

/** The same under lock, so that two tabs answer one after the other and neither undoes the other's answers. */
export async function lockCheck(trx: Trx, id: CheckId, since: Date): Promise<Check | null> {
  const row: unknown = await alive(trx, id, since).forUpdate().first();
  return row === undefined ? null : checkRow.parse(row);
}

const alive = (db: Knex, id: CheckId, since: Date) =>
  db('checks')
    .where({ id })
    .where((either) => {
      void either.where('kept', true).orWhere('touched_at', '>=', since);
    })
    .select(...COLUMNS);

/** Writes what was said back. The caller holds the lock. */
export async function updateCheck(trx: Trx, check: Omit<Check, 'fromNote' | 'kept' | 'touchedAt'>, at: Date): Promise<void> {
  await trx('checks')
    .where({ id: check.id })
    .update({
      regions: canonicalJson(check.regions),
      sale_on: check.saleOn,
      answers: canonicalJson(check.answers),
      declined: canonicalJson(check.declined),
      entry: check.entry === null ? null : canonicalJson(check.entry),
      shown: check.shown === null ? null : canonicalJson(check.shown),
      version: trx.raw('version + 1'),
      touched_at: at,
    });
}

/** Deletes up to `most` checks last touched before `since` that nobody kept. Answers with how many went. */
export async function deleteOldChecks(db: Knex, since: Date, most: number): Promise<number> {
  return db('checks').where({ kept: false }).where('touched_at', '<', since).limit(most).del();
}
