import 'server-only';
import { listRegions } from '@/db/regions';
import { listRuleIds } from '@/db/rules';
import type { Ctx } from '@/lib/server/ctx';

/** Codes of all places with a sheet, and ids of all rules in use: what a list of addresses is made from. */
export async function listAddresses(ctx: Ctx): Promise<{ readonly regions: readonly string[]; readonly rules: readonly string[] }> {
  const [regions, rules] = await Promise.all([listRegions(ctx.db), listRuleIds(ctx.db)]);
  return { regions: regions.filter(({ edition }) => edition !== null).map(({ code }) => code), rules };
}
