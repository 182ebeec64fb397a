import { canonicalJson } from '@/lib/kernel/canonical-json';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import type { Condition } from './condition';
import { sayCondition, type SaidCondition } from './condition-words';
import { payloadLines, type PayloadLine } from './payload-lines';
import { sayDates } from './rule-dates';
import type { Citation, Rule, Source, Term } from './rule';
import type { Contact, Membership, Sheet } from './sheet';
import type { SheetNames } from './sheet-names';
import { tellRule } from './told-rule';
import type { Trial } from './trial';

/** The members of an item in words, by their names in the document. */
export type MemberWords = Readonly<Record<string, string>>;

/** Names of the sheet's own words; of those of layers above their ids are shown. */
const named = ({ code, name, terms }: Sheet): SheetNames => ({
  terms: new Map(terms.map((term) => [term.id, { name: term.name, region: code, category: term.category }])),
  regions: new Map([[code, name]]),
});
const lines = (texts: readonly string[]): string => texts.join('\n');

/** A condition in one text, lists as lines. */
const conditionText = (condition: Condition, names: SheetNames): string => lines(saidLines(sayCondition(condition, names), ''));

const plain = { b: (text: string): string => text };

function headOf({ join, parts }: Extract<SaidCondition, { kind: 'list' }>): string {
  switch (join) {
    case 'all':
      return words.markup('regions.condition.part.all', plain);
    case 'any':
      return words.markup('regions.condition.part.any', plain);
    case 'none':
      return words.markup('regions.condition.part.none', { ...plain, count: parts.length });
    case 'not-all':
      return words.markup('regions.condition.part.not-all', plain);
  }
}

function saidLines(said: SaidCondition, indent: string): readonly string[] {
  if (said.kind === 'line') return [`${indent}${said.text}`];
  if (said.kind !== 'list') return [`${indent}${words(`regions.condition.part.${said.kind}`)}`];
  const { parts, unless } = said;
  const inner = (list: readonly SaidCondition[]): readonly string[] => list.flatMap((part) => saidLines(part, `${indent}  `));
  const head = words.markup('regions.condition.unless', { ...plain, count: unless.length });
  return [`${indent}${headOf(said)}`, ...inner(parts), ...(unless.length === 0 ? [] : [`${indent}${head}`]), ...inner(unless)];
}

function detailText(line: PayloadLine): string {
  const text = (): string => {
    if (line.kind === 'text') return line.text;
    if (line.kind === 'texts') return line.texts.join(', ');
    return line.kind === 'link' ? line.href : line.quotes.map((quote) => `${quote.language}: “${quote.text}”`).join('; ');
  };
  return `${line.name}: ${text()}`;
}

function citationText({ source, locator, passage, standing, evidence }: Citation, sources: readonly Source[]): string {
  const title = sources.find(({ id }) => id === source)?.title ?? source;
  const where = locator === undefined ? title : `${title}, ${locator}`;
  const quoted = passage === undefined ? where : `${where}: “${passage}”`;
  return `${quoted} (${words(`regions.standing.${standing}`)}, ${words(`editions.evidence.${evidence}`)})`;
}

const cited = (list: readonly Citation[], sources: readonly Source[]): string => lines(list.map((one) => citationText(one, sources)));

export function ruleWords(rule: Rule, sheet: Sheet): MemberWords {
  return {
    title: rule.title,
    says: rule.says,
    when: conditionText(rule.when, named(sheet)),
    kind: words(`editions.kind.${rule.kind}`),
    targets: rule.targets.join(', '),
    alongside: rule.alongside.join(', '),
    from: sayDates({ from: rule.from, to: null }),
    to: sayDates({ from: null, to: rule.to }),
    strength: words(`regions.strength.${rule.strength}`),
    standing: words(`regions.standing.${rule.standing}`),
    firm: words(`editions.firm.${rule.firm ? 'yes' : 'no'}`),
    payload: lines(payloadLines(tellRule(rule, sheet.sources).payload).map(detailText)),
    sources: cited(rule.sources, sheet.sources),
    lookAgainBy: sayDate(rule.lookAgainBy),
    ...(rule.note === undefined ? {} : { note: rule.note }),
  };
}

export const termWords = (term: Term, sheet: Sheet): MemberWords => ({
  name: term.name,
  says: term.says,
  when: conditionText(term.when, named(sheet)),
  category: words(`editions.category.${term.category ? 'yes' : 'no'}`),
  from: sayDates({ from: term.from, to: null }),
  to: sayDates({ from: null, to: term.to }),
  sources: cited(term.sources, sheet.sources),
});

export function sourceWords({ seenOn, fingerprint, ...source }: Source): MemberWords {
  return {
    ...source,
    ...(seenOn === undefined ? {} : { seenOn: sayDate(seenOn) }),
    ...(fingerprint === undefined ? {} : { fingerprint: fingerprint.sha256 }),
  };
}

export const contactWords = ({ name, url, role, evidence }: Contact): MemberWords => ({
  name,
  role,
  url: url ?? '',
  evidence: words(`editions.evidence.${evidence}`),
});

export const membershipWords = ({ from, to, except }: Membership): MemberWords => ({
  from: sayDates({ from, to: null }),
  to: sayDates({ from: null, to }),
  except: lines(except.map(({ rule, why }) => `${rule}: ${why}`)),
});

export const trialWords = (trial: Trial): MemberWords => ({
  title: trial.title,
  on: sayDate(trial.on),
  answers: canonicalJson(trial.answers),
  declined: trial.declined.join(', '),
  expected: canonicalJson(trial.expected),
});

export const placeWordsOf = ({ name, kind, languages }: Sheet): MemberWords => ({
  name,
  kind: words(`editions.regionKind.${kind}`),
  languages: languages.join(', '),
});
