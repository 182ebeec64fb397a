import { z } from 'zod';
import { NOTE_TOPICS, type Payload } from './domain/rule';
import { calendarDate, evidence, lang, words } from '@/lib/kernel/shapes';

const tolerance = z.strictObject({ value: z.number(), plusMinus: z.number().nonnegative() });
const money = z.strictObject({ amount: z.string().regex(/^\d{1,15}(\.\d{1,6})?$/), currency: z.string().regex(/^[A-Z]{3}$/) });
const note = {
  who: words.exactOptional(),
  where: words.exactOptional(),
  by: words.exactOptional(),
  link: z.url().exactOptional(),
  details: words.exactOptional(),
};
const details = words.exactOptional();

const LIMIT_UNITS: Readonly<Record<string, readonly string[]>> = {
  L: ['mg/L', 'ug/mL', 'ug/L', 'ppm'],
  dm2: ['mg/dm2', 'ug/cm2', 'ug/dm2'],
  article: ['mg/article', 'ug/article'],
  kg: ['mg/kg', 'ppm', 'percent'],
};

const limit = z
  .strictObject({
    topic: z.literal('limit'),
    substance: z.string().regex(/^[A-Z][a-z]?$/, 'Give the symbol of the element, such as "Pb"'),
    part: z.enum(['inside', 'rim', 'article', 'glaze', 'metal-part']),
    per: z.enum(['L', 'dm2', 'article', 'kg']),
    amount: z.strictObject({ value: z.number().positive(), unit: words, evidence }),
    decision: z.strictObject({
      kind: z.enum(['each', 'mean-of', 'first-then-three']),
      specimens: z.int().positive(),
      evidence,
      atLimit: z.enum(['within', 'over', 'unclear']),
    }),
  })
  .refine((it) => LIMIT_UNITS[it.per]?.includes(it.amount.unit) === true, {
    error: 'The unit does not fit what the limit is per (L: mg/L, ug/mL, ug/L, ppm; dm2: mg/dm2, ug/cm2; article: mg/article; kg: mg/kg)',
    path: ['amount', 'unit'],
  });

export const payload = z.discriminatedUnion('topic', [
  limit,
  z.strictObject({
    topic: z.literal('method'),
    simulant: words.exactOptional(),
    concentrationPercent: z.number().positive().exactOptional(),
    temperatureC: tolerance.exactOptional(),
    hours: tolerance.exactOptional(),
    light: z.enum(['dark', 'dark-if-cadmium', 'any']).exactOptional(),
    hot: z.boolean().exactOptional(),
    fill: words.exactOptional(),
    reporting: words.exactOptional(),
    details,
  }),
  z.strictObject({
    topic: z.literal('firing'),
    leastPeakC: z.number().positive().exactOptional(),
    glazedInside: z.boolean().exactOptional(),
    details,
  }),
  z.strictObject({
    topic: z.literal('volume-threshold'),
    mostPiecesAYear: z.int().positive().exactOptional(),
    mostTurnoverAYear: money.exactOptional(),
    details,
  }),
  z.strictObject({ topic: z.literal('testing'), who: details, accredited: z.boolean().exactOptional(), often: details, details }),
  z.strictObject({
    topic: z.literal('cost'),
    low: z.number().nonnegative(),
    high: z.number().nonnegative(),
    currency: z.string().regex(/^[A-Z]{3}$/),
    per: z.enum(['combination', 'substance', 'specimen']),
    asOf: calendarDate,
  }),
  z.strictObject({
    topic: z.literal('label'),
    words: z.record(lang, words).exactOptional(),
    leastLetterMm: z.number().positive().exactOptional(),
    permanent: z.boolean().exactOptional(),
    placement: details,
    symbol: details,
    details,
  }),
  z.strictObject({
    topic: z.literal('paper'),
    document: words,
    fields: z.array(words).exactOptional(),
    heldBy: details,
    stage: details,
    yearsKept: z.number().positive().exactOptional(),
  }),
  z.strictObject({ topic: z.enum(NOTE_TOPICS), ...note }),
]) satisfies z.ZodType<Payload>;
