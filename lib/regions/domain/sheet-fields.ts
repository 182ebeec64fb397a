import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import type { Field, FieldName, FieldValue } from './field-difference';
import { payloadLines, type PayloadLine } from './payload-lines';
import { sayDates } from './rule-dates';
import type { Citation, Rule, Source, Term } from './rule';
import type { Contact, Membership, Sheet } from './sheet';
import { tellRule } from './told-rule';
import type { Trial } from './trial';

/** A field where the version has it. */
const own = (field: FieldName, text: string | undefined): readonly Field[] => (text === undefined ? [] : [{ field, words: text }]);
const held = (field: FieldName, value: FieldValue): Field => ({ field, value });
const said = (field: FieldName, text: string): Field => held(field, { kind: 'text', text });
const asText = (field: FieldName, text: string | undefined): readonly Field[] => (text === undefined ? [] : [said(field, text)]);
const onDay = (field: FieldName, day: CalendarDate | undefined): readonly Field[] => (day === undefined ? [] : [said(field, sayDate(day))]);
const link = (field: FieldName, href: string | null | undefined): readonly Field[] =>
  href === null || href === undefined ? [] : [held(field, { kind: 'link', href })];
const list = (field: FieldName, texts: readonly string[]): readonly Field[] =>
  texts.length === 0 ? [] : [held(field, { kind: 'texts', texts })];
const ids = (field: FieldName, kind: 'rules' | 'questions', named: readonly string[]): readonly Field[] =>
  named.length === 0 ? [] : [held(field, { kind, ids: named })];

/** A rule in fields, in the order they are compared. Its place among the rules is no field. */
export function ruleFields(rule: Rule, sources: readonly Source[]): readonly Field[] {
  const { topic, payload } = tellRule(rule, sources);
  return [
    ...own('title', rule.title),
    ...own('says', rule.says),
    held('when', { kind: 'condition', of: 'rule', condition: rule.when }),
    said('kind', words(`editions.kind.${rule.kind}`)),
    ...ids('targets', 'rules', rule.targets),
    ...ids('alongside', 'rules', rule.alongside),
    said('dates', sayDates(rule)),
    said('strength', words(`regions.strength.${rule.strength}`)),
    said('standing', words(`regions.standing.${rule.standing}`)),
    said('firm', words(`editions.firm.${rule.firm ? 'yes' : 'no'}`)),
    said('topic', words(`regions.topic.${topic}`)),
    ...payloadLines(payload).map(detail),
    ...own('note', rule.note),
    ...citations(rule.sources, sources),
    ...onDay('lookAgainBy', rule.lookAgainBy),
    ...list('facts', rule.facts),
  ];
}

/** A plain line of words is compared word by word; all else as a whole. */
const detail = (line: PayloadLine): Field =>
  line.kind === 'text' && line.fromMemory !== true
    ? { field: 'detail', name: line.name, words: line.text }
    : { field: 'detail', name: line.name, value: { kind: 'detail', line } };

/** Each use of a source, known by the text and the place in it; what is cited twice in one place is counted. */
function citations(cited: readonly Citation[], sources: readonly Source[]): readonly Field[] {
  const seen = new Map<string, number>();
  return cited.map((citation) => {
    const place = `${citation.source} ${citation.locator ?? ''}`;
    const count = (seen.get(place) ?? 0) + 1;
    seen.set(place, count);
    const title = sources.find(({ id }) => id === citation.source)?.title ?? citation.source;
    return { field: 'source', name: title, key: `${place} ${String(count)}`, value: { kind: 'citation', title, citation } };
  });
}

/** A term in fields. */
export function termFields(term: Term, sources: readonly Source[]): readonly Field[] {
  return [
    ...own('name', term.name),
    ...own('says', term.says),
    held('when', { kind: 'condition', of: 'term', condition: term.when }),
    said('category', words(`editions.category.${term.category ? 'yes' : 'no'}`)),
    said('dates', sayDates(term)),
    ...citations(term.sources, sources),
    ...list('facts', term.facts),
  ];
}

/** A source in fields. */
export function sourceFields(source: Source): readonly Field[] {
  return [
    ...asText('title', source.title),
    ...asText('publisher', source.publisher),
    ...asText('identifier', source.identifier),
    ...link('url', source.url),
    ...asText('versionDate', source.versionDate),
    ...onDay('seenOn', source.seenOn),
    ...asText('seenVia', source.seenVia),
    ...asText('fingerprint', source.fingerprint?.sha256),
  ];
}

/** Somebody to ask, in fields; the name is what they are known by. */
export function contactFields({ role, url, evidence }: Contact): readonly Field[] {
  return [...own('role', role), ...link('url', url), said('evidence', words(`editions.evidence.${evidence}`))];
}

/** A membership in fields; the layer above is what it is known by. */
export function membershipFields(edge: Membership): readonly Field[] {
  return [
    said('dates', sayDates(edge)),
    ...(edge.except.length === 0 ? [] : [held('except', { kind: 'exceptions', except: edge.except })]),
  ];
}

/** A trial piece in fields. */
export function trialFields(trial: Trial): readonly Field[] {
  return [
    ...own('title', trial.title),
    ...onDay('on', trial.on),
    held('answers', { kind: 'answers', answers: trial.answers }),
    ...ids('declined', 'questions', trial.declined),
    held('expected', { kind: 'expected', expected: trial.expected }),
  ];
}

/** What stands in a sheet beside its lists. */
export function headFields(sheet: Sheet): readonly Field[] {
  return [
    ...own('name', sheet.name),
    said('regionKind', words(`editions.regionKind.${sheet.kind}`)),
    ...list('languages', sheet.languages),
    ...own('text', sheet.text),
    { field: 'gaps', words: sheet.gaps.join('\n\n') },
    ...list('facts', sheet.textFacts),
  ];
}
