import { canonicalJson } from '@/lib/kernel/canonical-json';
import type { Citation, Rule, Term } from '@/lib/regions/domain/rule';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { fault, inRule, type Finding, type FindingAt } from './finding';

/**
 * C7: every rule has a source; what was read has the day it was seen; a claim that the edition before does not hold has a
 * passage. Common practice has no text to quote or to look at.
 */
export function checkSources(proposed: Sheet, base: Sheet | null): readonly Finding[] {
  const rulesBefore = new Map((base?.rules ?? []).map((rule) => [rule.id, rule]));
  const termsBefore = new Set((base?.terms ?? []).map(({ id }) => id));
  return [
    ...proposed.rules.flatMap((rule) => [
      ...(rule.sources.length === 0 ? [fault('C7', { at: inRule(rule.id, 'sources'), kind: 'no-source' })] : []),
      ...unseen(proposed, rule.sources, (place) => inRule(rule.id, `sources/${place}`)),
      ...unquoted(rule, rulesBefore.get(rule.id) ?? null),
    ]),
    ...proposed.terms.flatMap((term) => [
      ...unseen(proposed, term.sources, (place) => ({ list: 'terms', id: term.id, field: `sources/${place}` })),
      ...(termsBefore.has(term.id) ? [] : unquotedTerm(term)),
    ]),
  ];
}

const hasText = ({ standing }: Citation): boolean => standing !== 'common-practice';

function unseen({ sources }: Sheet, cited: readonly Citation[], at: (place: number) => FindingAt): readonly Finding[] {
  return cited.flatMap((citation, place): readonly Finding[] => {
    const source = sources.find(({ id }) => id === citation.source);
    const isMissing = hasText(citation) && citation.evidence === 'read' && source?.seenOn === undefined;
    return isMissing ? [fault('C7', { at: at(place), kind: 'no-seen-date', values: { source: citation.source } })] : [];
  });
}

/** A new rule needs a passage, and so does one that claims something else than before: what it was kept for no longer bears it. */
function unquoted(rule: Rule, before: Rule | null): readonly Finding[] {
  const texts = rule.sources.filter(hasText);
  if (texts.length === 0 || texts.some(({ passage }) => passage !== undefined)) return [];
  const at = inRule(rule.id, 'sources/0/passage');
  if (before === null) return [fault('C7', { at, kind: 'no-passage' })];
  return claimOf(rule) === claimOf(before) ? [] : [fault('C7', { at, kind: 'no-passage-changed' })];
}

/** What a rule claims: what it asks of whom, when, and how strongly. */
const claimOf = ({ kind, targets, when, from, to, strength, payload }: Rule): string =>
  canonicalJson([kind, targets, when, from, to, strength, payload]);

function unquotedTerm({ id, sources }: Term): readonly Finding[] {
  const texts = sources.filter(hasText);
  const isQuoted = texts.length === 0 || texts.some(({ passage }) => passage !== undefined);
  return isQuoted ? [] : [fault('C7', { at: { list: 'terms', id, field: 'sources/0/passage' }, kind: 'no-passage' })];
}
