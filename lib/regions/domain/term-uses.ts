import type { Condition } from './condition';
import type { Evidence, Rule } from './rule';
import type { Sheet } from './sheet';
import { evidenceOf } from './told-rule';

type Placed = { readonly id: string; readonly title: string; readonly place: { readonly code: string; readonly name: string } };

export type UsingRule = Placed & Pick<Rule, 'strength' | 'standing'> & { readonly evidence: Evidence };

/** What names a term in its condition: rules, and other terms, through which more rules may rest on it. */
export type TermUses = { readonly rules: readonly UsingRule[]; readonly terms: readonly Placed[] };

/** Whether a condition names that term. */
export function namesTerm(condition: Condition, term: string): boolean {
  if (typeof condition === 'boolean') return false;
  if ('all' in condition) return condition.all.some((part) => namesTerm(part, term));
  if ('any' in condition) return condition.any.some((part) => namesTerm(part, term));
  if ('not' in condition) return namesTerm(condition.not, term);
  return 'term' in condition && condition.term === term;
}

/** Rules and terms of these sheets that name the term, sheet by sheet in their own order. */
export function usesOfTerm(sheets: readonly Sheet[], term: string): TermUses {
  const using = <Item extends { readonly when: Condition }>(items: readonly Item[]): readonly Item[] =>
    items.filter(({ when }) => namesTerm(when, term));
  return {
    rules: sheets.flatMap(({ code, name, rules }) =>
      using(rules)
        .toSorted((a, b) => a.order - b.order)
        .map((rule): UsingRule => {
          const { id, title, strength, standing } = rule;
          return { id, title, strength, standing, evidence: evidenceOf(rule), place: { code, name } };
        }),
    ),
    terms: sheets.flatMap(({ code, name, terms }) => using(terms).map(({ id, name: title }) => ({ id, title, place: { code, name } }))),
  };
}
