import { sayDate } from '@/lib/kernel/say';
import { LOCALE, type MESSAGES, words } from '@/lib/kernel/words';
import { sayDecision, sayFigure, sayLimit, sayMoney, sayPart, saySubstance, sayTolerance, sayUnit } from './figure-words';
import type {
  CostPayload,
  Evidence,
  FiringPayload,
  LabelPayload,
  LimitPayload,
  MethodPayload,
  NotePayload,
  PaperPayload,
  TestingPayload,
  VolumePayload,
} from './rule';
import type { ToldPayload } from './told-rule';

/** One detail of a rule: what it is about, and its words. Words that the source fixes carry their language. */
export type PayloadLine = { readonly name: string } & (
  | { readonly kind: 'text'; readonly text: string; readonly fromMemory?: true }
  | { readonly kind: 'texts'; readonly texts: readonly string[]; readonly fromMemory?: true }
  | { readonly kind: 'quotes'; readonly quotes: readonly { readonly lang: string; readonly language: string; readonly text: string }[] }
  | { readonly kind: 'link'; readonly href: string }
);

type Without<Each> = Omit<Each, 'topic'>;
/** Every field that is none of a limit's or a cost's: no two topics mean different things by one name. */
type Fields = Partial<
  Without<MethodPayload> &
    Without<FiringPayload> &
    Without<VolumePayload> &
    Without<LabelPayload> &
    Without<PaperPayload> &
    Without<TestingPayload> &
    Without<NotePayload>
>;

/** The details of a rule in words, in the order they are read. What the source does not say has no line. */
export function payloadLines(payload: ToldPayload): readonly PayloadLine[] {
  if ('decision' in payload) return limitLines(payload);
  if ('asOf' in payload) return costLines(payload);
  return [
    ...methodLines(payload),
    ...firingLines(payload),
    ...volumeLines(payload),
    ...labelLines(payload),
    ...paperLines(payload),
    ...noteLines(payload),
  ];
}

type FieldName = keyof typeof MESSAGES.regions.field;

/** A line where there is a value, none where the source gives none. */
function line<T>(name: FieldName, value: T | undefined, say: (value: T) => string): readonly PayloadLine[] {
  return value === undefined ? [] : [{ name: words(`regions.field.${name}`), kind: 'text', text: say(value) }];
}

const LANGUAGES = new Intl.DisplayNames(LOCALE, { type: 'language' });
const asItIs = (said: string): string => said;
const memoryMark = (evidence: Evidence): { readonly fromMemory?: true } => (evidence === 'memory' ? { fromMemory: true } : {});

function limitLines({ substance, part, per, amount, decision }: Without<LimitPayload>): readonly PayloadLine[] {
  return [
    ...line('substance', substance, saySubstance),
    { name: words('regions.field.limit'), kind: 'text', text: sayLimit({ amount, decision }), ...memoryMark(amount.evidence) },
    ...line('where', { part, per }, sayPart),
    { name: words('regions.field.decision'), kind: 'texts', texts: sayDecision(decision), ...memoryMark(decision.evidence) },
  ];
}

function costLines({ low, high, currency, per, asOf }: Without<CostPayload>): readonly PayloadLine[] {
  const range = { low: sayMoney(String(low), currency), high: sayMoney(String(high), currency) };
  return [
    ...line('cost', range, (said) => (low === high ? said.low : words('regions.cost.range', said))),
    ...line('costPer', per, (each) => words(`regions.cost.per.${each}`)),
    ...line('asOf', asOf, sayDate),
  ];
}

function methodLines({ simulant, concentrationPercent, temperatureC, hours, light, hot, fill, reporting }: Fields): readonly PayloadLine[] {
  return [
    ...line('simulant', simulant, asItIs),
    ...line('concentration', concentrationPercent, (value) => sayUnit(value, 'percent')),
    ...line('temperature', temperatureC, (value) => sayTolerance(value, 'C')),
    ...line('hours', hours, (value) => sayTolerance(value, 'h')),
    ...line('light', light, (kind) => words(`regions.light.${kind}`)),
    ...line('hot', hot, (yes) => words(yes ? 'regions.hot.yes' : 'regions.hot.no')),
    ...line('fill', fill, asItIs),
    ...line('reporting', reporting, asItIs),
  ];
}

function firingLines({ leastPeakC, glazedInside }: Fields): readonly PayloadLine[] {
  return [
    ...line('firing', leastPeakC, (value) => words('regions.firing.least', { amount: sayUnit(value, 'C') })),
    ...line('inside', glazedInside, (yes) => words(yes ? 'regions.firing.glazed' : 'regions.firing.unglazed')),
  ];
}

function volumeLines({ mostPiecesAYear, mostTurnoverAYear }: Fields): readonly PayloadLine[] {
  return [
    ...line('pieces', mostPiecesAYear, (count) => words('regions.volume.pieces', { count })),
    ...line('turnover', mostTurnoverAYear, ({ amount, currency }) =>
      words('regions.volume.turnover', { amount: sayMoney(amount, currency) }),
    ),
  ];
}

function labelLines({ words: exact = {}, leastLetterMm, permanent, placement, symbol }: Fields): readonly PayloadLine[] {
  const quotes = Object.entries(exact).map(([lang, said]) => ({ lang, language: LANGUAGES.of(lang) ?? lang, text: said }));
  return [
    ...(quotes.length === 0 ? [] : [{ name: words('regions.field.words'), kind: 'quotes', quotes } as const]),
    ...line('letters', leastLetterMm, (value) => words('regions.label.letters', { height: sayUnit(value, 'mm') })),
    ...line('permanent', permanent, (yes) => words(yes ? 'regions.label.permanent' : 'regions.label.removable')),
    ...line('placement', placement, asItIs),
    ...line('symbol', symbol, asItIs),
  ];
}

function paperLines({ document, fields = [], heldBy, stage, yearsKept }: Fields): readonly PayloadLine[] {
  return [
    ...line('document', document, asItIs),
    ...(fields.length === 0 ? [] : [{ name: words('regions.field.fields'), kind: 'texts', texts: fields } as const]),
    ...line('heldBy', heldBy, asItIs),
    ...line('stage', stage, asItIs),
    ...line('kept', yearsKept, (count) => words('regions.paper.years', { count, years: sayFigure(count) })),
  ];
}

function noteLines({ who, where, by, often, accredited, link, details }: Fields): readonly PayloadLine[] {
  return [
    ...line('who', who, asItIs),
    ...line('at', where, asItIs),
    ...line('by', by, asItIs),
    ...line('often', often, asItIs),
    ...line('lab', accredited, (yes) => words(yes ? 'regions.testing.accredited' : 'regions.testing.any')),
    ...(link === undefined ? [] : [{ name: words('regions.field.link'), kind: 'link', href: link } as const]),
    ...line('details', details, asItIs),
  ];
}
