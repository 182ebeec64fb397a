import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { LOCALE } from '@/lib/kernel/words';
import { isInForce, type Rule } from './rule';
import type { Sheet } from './sheet';

/** A fault stops a build; a remark is for whoever minds the sheet. */
export type ContentFault = { readonly kind: 'banned-word' | 'unsourced-must'; readonly at: string; readonly said: string };
export type ContentRemark = { readonly kind: 'long-sentence' | 'dead-link' | 'look-again'; readonly at: string; readonly said: string };

/** What a sheet holds, in figures, and what is amiss with it. */
export type ContentReport = {
  readonly code: string;
  readonly rules: number;
  /** Rules by how well their main statement is known; common practice apart, since it has no text. */
  readonly read: number;
  readonly memory: number;
  readonly commonPractice: number;
  readonly limits: number;
  readonly trials: number;
  readonly faults: readonly ContentFault[];
  readonly remarks: readonly ContentRemark[];
};

/** Words we never use of a pot, and phrases in which they stand all the same. */
export type WordLists = { readonly banned: readonly string[]; readonly allowed: readonly string[] };

type Said = { readonly at: string; readonly text: string };

const MOST_WORDS = 30;

/** Looks a sheet through on a day. No link is opened: an address is only read. */
export function reportSheet(sheet: Sheet, lists: WordLists, on: CalendarDate): ContentReport {
  const own = ownTexts(sheet);
  const practice = sheet.rules.filter(({ standing }) => standing === 'common-practice');
  const sourced = sheet.rules.filter(({ standing }) => standing !== 'common-practice');
  const read = sourced.filter(isRead);
  return {
    code: sheet.code,
    rules: sheet.rules.length,
    read: read.length,
    memory: sourced.length - read.length,
    commonPractice: practice.length,
    limits: sheet.rules.filter(({ payload }) => payload.topic === 'limit').length,
    trials: sheet.trials.length,
    faults: [...bannedWords(own, lists), ...unsourcedMusts(sheet)],
    remarks: [...longSentences(own), ...deadLinks(sheet), ...dueRules(sheet, on)],
  };
}

const isRead = ({ payload, sources }: Rule): boolean =>
  (payload.topic === 'limit' ? payload.amount.evidence : (sources[0]?.evidence ?? 'memory')) === 'read';

/** What we say ourselves. Titles, passages and fixed wordings are other people's words. */
function ownTexts(sheet: Sheet): readonly Said[] {
  const inRule = (rule: Rule): readonly Said[] => [
    { at: `rules/${rule.id}/title`, text: rule.title },
    { at: `rules/${rule.id}/says`, text: rule.says },
    { at: `rules/${rule.id}/note`, text: rule.note ?? '' },
    ...payloadTexts(rule),
  ];
  return [
    { at: 'name', text: sheet.name },
    { at: 'text', text: sheet.text },
    ...sheet.gaps.map((text, place) => ({ at: `gaps/${String(place)}`, text })),
    ...sheet.rules.flatMap(inRule),
    ...sheet.terms.flatMap(({ id, name, says }) => [
      { at: `terms/${id}/name`, text: name },
      { at: `terms/${id}/says`, text: says },
    ]),
    ...sheet.memberships.flatMap(({ parent, except }) =>
      except.map(({ rule, why }) => ({ at: `memberships/${parent}/${rule}`, text: why })),
    ),
  ].filter(({ text }) => text !== '');
}

/** Members of a payload in which we explain; the words of a label and the fields of a paper are quoted. */
const OWN_MEMBERS = ['details', 'who', 'often', 'placement', 'where', 'by'] as const;

function payloadTexts({ id, payload }: Rule): readonly Said[] {
  const members = new Map<string, unknown>(Object.entries(payload));
  return OWN_MEMBERS.flatMap((member) => {
    const text = members.get(member);
    return typeof text === 'string' ? [{ at: `rules/${id}/${member}`, text }] : [];
  });
}

const inWords = (phrases: readonly string[]): RegExp => new RegExp(`(?<![\\p{L}])(?:${phrases.join('|')})(?![\\p{L}])`, 'giu');

/** Words between quotation marks are somebody else's. */
const QUOTED = /“[^”]*”|"[^"]*"/g;

function bannedWords(texts: readonly Said[], { banned, allowed }: WordLists): readonly ContentFault[] {
  return texts.flatMap(({ at, text }) => {
    const own = text.replace(/\s+/g, ' ').replace(QUOTED, '').replace(inWords(allowed), '');
    return (own.match(inWords(banned)) ?? []).map((said) => ({ kind: 'banned-word' as const, at, said }));
  });
}

/** A must rests on law that was read; the schema asks it of the first source, this of the whole list. */
function unsourcedMusts({ rules }: Sheet): readonly ContentFault[] {
  return rules
    .filter(({ strength }) => strength === 'must')
    .filter(({ sources }) => !sources.some(({ standing, evidence }) => standing === 'law' && evidence === 'read'))
    .map(({ id, title }) => ({ kind: 'unsourced-must', at: `rules/${id}/sources`, said: title }));
}

const SENTENCES = new Intl.Segmenter(LOCALE, { granularity: 'sentence' });
const WORDS = new Intl.Segmenter(LOCALE, { granularity: 'word' });

/** Lines of Markdown lists and headings end a sentence even without a full stop; addresses are no words. */
const sentencesOf = (text: string): readonly string[] =>
  text
    .replace(/\]\([^)]*\)/g, ']')
    .replace(/https?:\/\/\S+/g, '')
    .split(/\n+/)
    .flatMap((line) => [...SENTENCES.segment(line)].map(({ segment }) => segment.trim()))
    .filter((sentence) => sentence !== '');

const countWords = (sentence: string): number => [...WORDS.segment(sentence)].filter(({ isWordLike }) => isWordLike === true).length;

function longSentences(texts: readonly Said[]): readonly ContentRemark[] {
  return texts.flatMap(({ at, text }) =>
    sentencesOf(text)
      .filter((sentence) => countWords(sentence) > MOST_WORDS)
      .map((said) => ({ kind: 'long-sentence' as const, at, said })),
  );
}

/** Hosts that stand for nothing. */
const PLACEHOLDER = /(^|[.])(example([.](com|org|net))?|test|invalid|localhost|local)$/i;

/** Whether an address can lead anywhere, by its form alone. */
export function isDeadInForm(address: string): boolean {
  if (!URL.canParse(address)) return true;
  const { protocol, hostname, username } = new URL(address);
  const isWeb = protocol === 'https:' || protocol === 'http:';
  return !isWeb || username !== '' || !hostname.includes('.') || PLACEHOLDER.test(hostname) || /[<>{}…\s]|%3C|%7B|TODO/i.test(address);
}

function deadLinks(sheet: Sheet): readonly ContentRemark[] {
  const links = [
    ...sheet.sources.map(({ id, url }) => ({ at: `sources/${id}/url`, url })),
    ...[...sheet.authorities, ...sheet.accreditation].map(({ name, url }) => ({ at: `contacts/${name}`, url: url ?? undefined })),
    ...sheet.rules.map(({ id, payload }) => ({ at: `rules/${id}/link`, url: 'link' in payload ? payload.link : undefined })),
    ...[...sheet.text.matchAll(/\]\(([^)\s]+)/g)].map(([, url]) => ({ at: 'text', url })),
  ];
  return links.flatMap(({ at, url }) =>
    url === undefined || url.startsWith('/') || !isDeadInForm(url) ? [] : [{ kind: 'dead-link' as const, at, said: url }],
  );
}

function dueRules({ rules }: Sheet, on: CalendarDate): readonly ContentRemark[] {
  return rules
    .filter((rule) => rule.lookAgainBy < on && isInForce(rule, on))
    .map(({ id, lookAgainBy }) => ({ kind: 'look-again', at: `rules/${id}`, said: lookAgainBy }));
}
