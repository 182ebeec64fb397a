import 'server-only';
import { listEditionsInUse } from '@/db/editions';
import { listRegions } from '@/db/regions';
import type { Ctx } from '@/lib/server/ctx';
import { readEdition } from '@/lib/server/sheets';

export type RestingRule = { readonly id: string; readonly title: string };

/** Rules of the base layers in use that carry one of these facts: what would have to be looked at again if a fact fell. */
export async function findRestingRules(ctx: Ctx, facts: readonly string[]): Promise<readonly RestingRule[]> {
  const regions = await listRegions(ctx.db);
  const base = regions.filter(({ kind, edition }) => kind === 'base' && edition !== null).map(({ code }) => code);
  const heads = await listEditionsInUse(ctx.db, base, ctx.now);
  const editions = await Promise.all(heads.map(({ region, number }) => readEdition(ctx.db, region, number)));
  return editions
    .flatMap((edition) => edition?.sheet.rules ?? [])
    .filter((rule) => rule.facts.some((fact) => facts.includes(fact)))
    .map(({ id, title }) => ({ id, title }));
}
