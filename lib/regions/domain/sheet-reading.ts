import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { Contact, RegionKind } from './sheet';
import type { RegionSheet, SheetLayer } from './told-sheet';
import type { ToldRule } from './told-rule';

/** Somebody to ask, and the sheet that names them. */
export type NamedContact = Contact & { readonly region: string };

type Layers = Pick<RegionSheet, 'code' | 'authorities' | 'accreditation'> & {
  readonly above: readonly Pick<SheetLayer, 'code' | 'authorities' | 'accreditation'>[];
};

/** Whom to ask: the place's own contacts first, then those of the layers above it, the nearest first. */
export function contactsOf(sheet: Layers, role: 'authorities' | 'accreditation'): readonly NamedContact[] {
  return [sheet, ...sheet.above.toReversed()].flatMap((layer) => layer[role].map((contact) => ({ ...contact, region: layer.code })));
}

/** The earliest day any source of these rules was read; the caution names it. */
export function earliestSeen(rules: readonly ToldRule[]): CalendarDate | null {
  return seenDays(rules).sort()[0] ?? null;
}

/** The last day a source of the rule was read. */
export function lastSeen(rule: ToldRule): CalendarDate | null {
  return seenDays([rule]).sort().at(-1) ?? null;
}

const seenDays = (rules: readonly ToldRule[]): CalendarDate[] =>
  rules.flatMap(({ sources }) => sources.flatMap(({ seenOn }) => (seenOn === undefined ? [] : [seenOn])));

/** The next look-again date among rules, and how many are past theirs. */
export function lookAgain(rules: readonly ToldRule[], today: CalendarDate): { readonly next: CalendarDate | null; readonly past: number } {
  const days = rules.map(({ lookAgainBy }) => lookAgainBy).sort();
  return { next: days.find((day) => day >= today) ?? null, past: days.filter((day) => day < today).length };
}

const COMING = /^##[ \t]+Coming[ \t]*$/m;

/** A sheet's text in two: the introduction, and what stands under its heading "Coming". */
export function splitText(text: string): { readonly introduction: string; readonly coming: string | null } {
  const found = COMING.exec(text);
  if (found === null) return { introduction: text.trim(), coming: null };
  return { introduction: text.slice(0, found.index).trim(), coming: text.slice(found.index + found[0].length).trim() };
}

/** Rings of a place's mark: one a layer. */
export function ringsOf(kind: RegionKind): 1 | 2 | 3 {
  if (kind === 'part') return 3;
  return kind === 'country' ? 2 : 1;
}

/** Topics in the order a sheet shows them. */
export const TOPIC_ORDER = [
  'limit',
  'testing',
  'method',
  'firing',
  'surface',
  'practice',
  'label',
  'paper',
  'traceability',
  'registration',
  'representative',
  'volume-threshold',
  'packaging',
  'customs',
  'cost',
  'other',
] as const satisfies readonly ToldRule['topic'][];

export type RuleGroup = { readonly topic: ToldRule['topic']; readonly rules: readonly ToldRule[] };

/** Rules by topic, common practice left out: it stands apart, under "Also said". */
export function groupRules(rules: readonly ToldRule[]): readonly RuleGroup[] {
  const sourced = rules.filter(({ standing }) => standing !== 'common-practice');
  return TOPIC_ORDER.map((topic) => ({ topic, rules: sourced.filter((rule) => rule.topic === topic) })).filter(
    (group) => group.rules.length > 0,
  );
}

/** What is said without a source, in the whole line. */
export function alsoSaid(layers: readonly Pick<SheetLayer, 'rules'>[]): readonly ToldRule[] {
  return layers.flatMap(({ rules }) => rules.filter(({ standing }) => standing === 'common-practice'));
}
