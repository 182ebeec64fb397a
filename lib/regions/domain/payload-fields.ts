import { NOTE_TOPICS, type Payload } from './rule';

export type Topic = Payload['topic'];

/** The topics of a rule in the order a form offers them. */
export const TOPICS: readonly Topic[] = [
  'limit',
  'method',
  'firing',
  'volume-threshold',
  'testing',
  'cost',
  'label',
  'paper',
  ...NOTE_TOPICS,
];

/** A field of a topic's details. What is not needed may stay empty and is then left out. */
export type PayloadField = { readonly name: string; readonly isNeeded?: true } & (
  | { readonly kind: 'text' | 'long' | 'lines' | 'yesno' | 'date' | 'link' }
  | { readonly kind: 'number'; readonly unit?: string }
  /** A value with how far it may be off: two fields, `.value` and `.plusMinus`. */
  | { readonly kind: 'tolerance'; readonly unit: string }
  /** `.amount` and `.currency`. */
  | { readonly kind: 'money' }
  | { readonly kind: 'choice'; readonly options: readonly string[] }
  /** Rows of `.lang` and `.text`. */
  | { readonly kind: 'words' }
);

const EVIDENCE = ['read', 'memory'] as const;
const NOTE: readonly PayloadField[] = [
  { name: 'who', kind: 'text' },
  { name: 'where', kind: 'text' },
  { name: 'by', kind: 'text' },
  { name: 'link', kind: 'link' },
  { name: 'details', kind: 'long' },
];

const BY_TOPIC: Readonly<Record<Exclude<Topic, (typeof NOTE_TOPICS)[number]>, readonly PayloadField[]>> = {
  limit: [
    { name: 'substance', kind: 'text', isNeeded: true },
    { name: 'part', kind: 'choice', options: ['inside', 'rim', 'article', 'glaze', 'metal-part'], isNeeded: true },
    { name: 'per', kind: 'choice', options: ['L', 'dm2', 'article', 'kg'], isNeeded: true },
    { name: 'amount.value', kind: 'number', isNeeded: true },
    { name: 'amount.unit', kind: 'choice', options: limitUnits(), isNeeded: true },
    { name: 'amount.evidence', kind: 'choice', options: EVIDENCE, isNeeded: true },
    { name: 'decision.kind', kind: 'choice', options: ['each', 'mean-of', 'first-then-three'], isNeeded: true },
    { name: 'decision.specimens', kind: 'number', isNeeded: true },
    { name: 'decision.evidence', kind: 'choice', options: EVIDENCE, isNeeded: true },
    { name: 'decision.atLimit', kind: 'choice', options: ['within', 'over', 'unclear'], isNeeded: true },
  ],
  method: [
    { name: 'simulant', kind: 'text' },
    { name: 'concentrationPercent', kind: 'number', unit: 'percent' },
    { name: 'temperatureC', kind: 'tolerance', unit: 'C' },
    { name: 'hours', kind: 'tolerance', unit: 'h' },
    { name: 'light', kind: 'choice', options: ['dark', 'dark-if-cadmium', 'any'] },
    { name: 'hot', kind: 'yesno' },
    { name: 'fill', kind: 'text' },
    { name: 'reporting', kind: 'text' },
    { name: 'details', kind: 'long' },
  ],
  firing: [
    { name: 'leastPeakC', kind: 'number', unit: 'C' },
    { name: 'glazedInside', kind: 'yesno' },
    { name: 'details', kind: 'long' },
  ],
  'volume-threshold': [
    { name: 'mostPiecesAYear', kind: 'number', unit: 'pieces' },
    { name: 'mostTurnoverAYear', kind: 'money' },
    { name: 'details', kind: 'long' },
  ],
  testing: [
    { name: 'who', kind: 'text' },
    { name: 'accredited', kind: 'yesno' },
    { name: 'often', kind: 'text' },
    { name: 'details', kind: 'long' },
  ],
  cost: [
    { name: 'low', kind: 'number', isNeeded: true },
    { name: 'high', kind: 'number', isNeeded: true },
    { name: 'currency', kind: 'text', isNeeded: true },
    { name: 'per', kind: 'choice', options: ['combination', 'substance', 'specimen'], isNeeded: true },
    { name: 'asOf', kind: 'date', isNeeded: true },
  ],
  label: [
    { name: 'words', kind: 'words' },
    { name: 'leastLetterMm', kind: 'number', unit: 'mm' },
    { name: 'permanent', kind: 'yesno' },
    { name: 'placement', kind: 'text' },
    { name: 'symbol', kind: 'text' },
    { name: 'details', kind: 'long' },
  ],
  paper: [
    { name: 'document', kind: 'text', isNeeded: true },
    { name: 'fields', kind: 'lines' },
    { name: 'heldBy', kind: 'text' },
    { name: 'stage', kind: 'text' },
    { name: 'yearsKept', kind: 'number', unit: 'years' },
  ],
};

function limitUnits(): readonly string[] {
  return ['mg/L', 'ug/mL', 'ug/L', 'ppm', 'mg/dm2', 'ug/cm2', 'ug/dm2', 'mg/article', 'ug/article', 'mg/kg', 'percent'];
}

/** The fields of a topic's details; none for what is no topic. */
export function fieldsOf(topic: string): readonly PayloadField[] {
  if (NOTE_TOPICS.some((one) => one === topic)) return NOTE;
  const found = Object.entries(BY_TOPIC).find(([name]) => name === topic);
  return found?.[1] ?? [];
}

/** The name of a field in the form of the rule. */
export const payloadName = (name: string): string => `payload.${name}`;
