import type { Knex } from 'knex';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { countedWishRow, type CountedWish } from './rows/region-wish-row';

/** `asker` is 32 bytes made of the address, the region and the day: the same one a second time changes nothing. */
export type NewWish = { readonly region: string; readonly day: CalendarDate; readonly asker: Buffer };

/** Puts a wish down. Sent again by the same asker on the same day, it is still one. */
export async function insertRegionWish(db: Knex, { region, day, asker }: NewWish): Promise<void> {
  await db('region_wishes').insert({ region, day, asker }).onConflict(['region', 'day', 'asker']).ignore();
}

/** How often each region was asked for, the most wanted first. */
export async function countRegionWishes(db: Knex, limit: number): Promise<readonly CountedWish[]> {
  const rows: unknown[] = await db('region_wishes')
    .groupBy('region')
    .orderBy('times', 'desc')
    .orderBy('region')
    .limit(limit)
    .select('region')
    .count({ times: '*' });
  return rows.map((row) => countedWishRow.parse(row));
}
