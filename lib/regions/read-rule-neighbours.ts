import 'server-only';
import { listEditionsInUse } from '@/db/editions';
import { listRegions } from '@/db/regions';
import type { Ctx } from '@/lib/server/ctx';
import { readEdition } from '@/lib/server/sheets';
import type { Rule } from './domain/rule';
import { neighboursOf, type RuleNeighbours } from './domain/rule-neighbours';

/** How a rule meets those of every sheet in use today. Sheets come out of memory: an edition never changes. */
export async function readRuleNeighbours(ctx: Ctx, rule: Pick<Rule, 'id' | 'targets' | 'alongside'>): Promise<RuleNeighbours> {
  const regions = await listRegions(ctx.db);
  const codes = regions.filter(({ edition }) => edition !== null).map(({ code }) => code);
  const heads = await listEditionsInUse(ctx.db, codes, ctx.now);
  const editions = await Promise.all(heads.map(({ region, number }) => readEdition(ctx.db, region, number)));
  return neighboursOf(
    rule,
    editions.flatMap((edition) => (edition === null ? [] : [edition.sheet])),
  );
}
