import 'server-only';
import { insertRegionWish } from '@/db/region-wishes';
import { listRegions } from '@/db/regions';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { take, type TooMany } from '@/lib/server/limits';
import { keyedHash } from '@/lib/server/seal';
import { countryCodes } from '@/lib/server/world-map';

/** `from` is the client's address as far as limits need it. It is kept only as a hash that is another one each day. */
export type WishCtx = Ctx & { readonly from: string };
export type WishRefusal = { readonly kind: 'no-such-country' } | { readonly kind: 'has-sheet' } | TooMany;

/** Counts a wish for a country without a sheet. One address counts once a day for each country, however often it asks. */
export async function wishForRegion(ctx: WishCtx, input: { readonly region: string }): Promise<Result<null, WishRefusal>> {
  if (!countryCodes.includes(input.region)) return err({ kind: 'no-such-country' });
  const regions = await listRegions(ctx.db);
  if (regions.some(({ code, edition }) => code === input.region && edition !== null)) return err({ kind: 'has-sheet' });
  const taken = await take('wish', ctx.from, ctx);
  if (!taken.ok) return taken;
  const day = calendarDateOf(ctx.now);
  const asker = keyedHash('wish', JSON.stringify([day, input.region, ctx.from]));
  await insertRegionWish(ctx.db, { region: input.region, day, asker });
  return ok(null);
}
