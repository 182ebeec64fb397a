import type { Knex } from 'knex';
import type { DraftEntry } from '@/lib/regions/domain/amendment-view';
import type { ItemKey } from '@/lib/regions/domain/sheet-items';
import { entryRow } from './rows/amendment-part-rows';
import type { Trx } from './transaction';
import { storedJson } from './well-formed';

const COLUMNS = ['item', 'version', 'entered', 'saved_at'] as const;

type Place = { readonly amendment: string; readonly item: ItemKey };

/** What was typed and not saved yet, in the order it was kept. */
export async function listEntries(db: Knex, amendment: string): Promise<readonly DraftEntry[]> {
  const rows: unknown[] = await db('amendment_entries')
    .where({ amendment_id: amendment })
    .orderBy(['saved_at', 'item'])
    .limit(1000)
    .select(...COLUMNS);
  return rows.map((row) => entryRow.parse(row));
}

/** The entry of one item; the caller holds the amendment, so that nobody else writes entries of it. */
export async function lockEntry(trx: Trx, { amendment, item }: Place): Promise<DraftEntry | null> {
  const row: unknown = await trx('amendment_entries')
    .where({ amendment_id: amendment, item })
    .select(...COLUMNS)
    .forUpdate()
    .first();
  return row === undefined ? null : entryRow.parse(row);
}

export async function putEntry(trx: Trx, amendment: string, { item, version, values, savedAt }: DraftEntry): Promise<void> {
  await trx('amendment_entries')
    .insert({ amendment_id: amendment, item, version, entered: storedJson(values), saved_at: savedAt })
    .onConflict(['amendment_id', 'item'])
    .merge(['version', 'entered', 'saved_at']);
}

/** Answers with whether there was one. */
export async function deleteEntry(trx: Trx, { amendment, item }: Place): Promise<boolean> {
  return (await trx('amendment_entries').where({ amendment_id: amendment, item }).del()) > 0;
}

/** An entry goes with its item when that gets another key. */
export async function moveEntry(trx: Trx, { amendment, item }: Place, to: ItemKey): Promise<void> {
  await trx('amendment_entries').where({ amendment_id: amendment, item }).update({ item: to });
}
