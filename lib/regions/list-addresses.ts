import 'server-only';
import { listRegions } from '@/db/regions';
import { listRuleIds } from '@/db/rules';
import { listTermIds } from '@/db/terms';
import type { Ctx } from '@/lib/server/ctx';

type Addresses = { readonly regions: readonly string[]; readonly rules: readonly string[]; readonly terms: readonly string[] };

/** Codes of all places with a sheet, and ids of all rules and terms in use: what a list of addresses is made from. */
export async function listAddresses(ctx: Ctx): Promise<Addresses> {
  const [regions, rules, terms] = await Promise.all([listRegions(ctx.db), listRuleIds(ctx.db), listTermIds(ctx.db)]);
  return { regions: regions.filter(({ edition }) => edition !== null).map(({ code }) => code), rules, terms };
}
