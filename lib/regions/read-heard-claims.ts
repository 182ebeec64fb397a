import 'server-only';
import claims from '@/content/heard/claims.json';
import { findRuleHome } from '@/db/rules';
import type { Ctx } from '@/lib/server/ctx';
import { readEdition } from '@/lib/server/sheets';
import type { AnsweredClaim, NamedRule } from './domain/heard-claim';
import type { Sheet } from './domain/sheet';
import { evidenceOf } from './domain/told-rule';
import { heardClaims } from './heard-schema';

/** What is said in the trade, each with the rules it is held against as their sheets stand now. A withdrawn rule is left out. */
export async function readHeardClaims(ctx: Ctx): Promise<readonly AnsweredClaim[]> {
  const heard = heardClaims.parse(claims);
  const ids = [...new Set(heard.flatMap(({ rules }) => rules))];
  const found = new Map(
    (await Promise.all(ids.map((id) => nameRule(ctx, id)))).flatMap((rule) => (rule === null ? [] : [[rule.id, rule]])),
  );
  return heard.map(({ rules, ...claim }) => ({ ...claim, rules: rules.flatMap((id) => found.get(id) ?? []) }));
}

async function nameRule(ctx: Ctx, id: string): Promise<NamedRule | null> {
  const home = await findRuleHome(ctx.db, id);
  if (home === null || home.edition < home.inUse) return null;
  const edition = await readEdition(ctx.db, home.region, home.edition);
  return edition === null ? null : named(edition.sheet, id);
}

function named({ name, rules, sources }: Sheet, id: string): NamedRule | null {
  const rule = rules.find((one) => one.id === id);
  if (rule === undefined) return null;
  const { title, strength, standing } = rule;
  const cited = rule.sources[0]?.source;
  const source = sources.find((one) => one.id === cited)?.title ?? null;
  return { id, title, place: name, strength, standing, evidence: evidenceOf(rule), source };
}
