import { z } from 'zod';
import { calendarDate, regionCode } from '@/lib/kernel/shapes';
import { words } from '@/lib/kernel/words';
import type { Answers } from '@/lib/checks/domain/knowledge';
import type { Fraction } from '@/lib/kernel/fraction';
import { MOST_DIGITS, readAmount } from './domain/amount';
import { PARTS, type Extract, type Reading } from './domain/reading';
import { isKnownUnit, UNITS } from './domain/unit';
import type { ReadingsInput } from './judge-readings';

/** More than any report holds, and few enough to be judged for every place at once. */
const MOST_READINGS = 500;

/** An exact amount: a number, or a decimal in quotation marks, for figures with more digits than a number keeps. */
const amount = z.unknown().transform((given, ctx): Fraction => {
  const read = readAmount(given);
  if (read.ok) return read.value;
  ctx.addIssue({ code: 'custom', message: words(`readings.fault.${read.error}`, { most: MOST_DIGITS }) });
  return z.NEVER;
});

/** Of an extract: null, or left out, where nobody noted it. */
const size = z.unknown().transform((given, ctx): Fraction | null => {
  if (given === null || given === undefined) return null;
  const read = readAmount(given);
  if (read.ok && read.value.numerator > 0n) return read.value;
  const fault = read.ok ? 'not-above-zero' : read.error;
  ctx.addIssue({ code: 'custom', message: words(`readings.fault.${fault}`, { most: MOST_DIGITS }) });
  return z.NEVER;
});

const part = z.enum(PARTS, { error: words('readings.fault.part', { parts: PARTS.join(', ') }) });

const reading = z.strictObject({
  specimen: z
    .string({ error: words('readings.fault.specimen') })
    .trim()
    .min(1, words('readings.fault.specimen'))
    .max(80),
  part: part.default('vessel'),
  substance: z.string({ error: words('readings.fault.substance') }).regex(/^[A-Z][a-z]?$/, words('readings.fault.substance')),
  value: amount,
  unit: z
    .string()
    .max(40)
    .refine(isKnownUnit, {
      error: ({ input }) => words('readings.fault.unit', { unit: String(input), units: UNITS.join(', ') }),
    }),
  below: z.boolean().default(false),
});

const readings = z
  .array(reading)
  .max(MOST_READINGS)
  .default([])
  .superRefine((list, ctx) => {
    for (const place of repeated(list, keyOf)) ctx.addIssue({ code: 'custom', path: [place], message: words('readings.fault.twice') });
  });

const keyOf = ({ specimen, substance, part: where }: Reading): string => JSON.stringify([specimen, substance, where]);

const extracts = z
  .array(z.strictObject({ part, volumeMl: size.optional(), areaCm2: size.optional() }))
  .max(PARTS.length)
  .default([])
  .transform((list) => list.map(({ part: where, volumeMl = null, areaCm2 = null }): Extract => ({ part: where, volumeMl, areaCm2 })))
  .superRefine((list, ctx) => {
    for (const place of repeated(list, ({ part: where }) => where))
      ctx.addIssue({ code: 'custom', path: [place], message: words('readings.fault.extractTwice') });
  });

const number = z.number({ error: words('readings.fault.number') });
const yesno = z.boolean({ error: words('readings.fault.yesno') });

/** What of the test's conditions is told. What is left out counts as run the way each method asks. */
const conditions = z
  .strictObject({
    temperatureC: number.min(-300, words('readings.fault.number')).max(10_000, words('readings.fault.number')).optional(),
    hours: number.min(0, words('readings.fault.hours')).max(1_000_000, words('readings.fault.number')).optional(),
    dark: yesno.optional(),
    hot: yesno.optional(),
  })
  .default({});

const regions = z
  .array(regionCode)
  .min(1, words('readings.fault.noRegion'))
  .max(30, words('readings.fault.manyRegions'))
  .refine((list) => new Set(list).size === list.length, { error: words('readings.fault.regionTwice') });

/** The body of `POST /api/v1/verdicts`. The schema of the answers belongs to the checks and is handed in. */
export const verdictInput = (answers: z.ZodType<Answers>): z.ZodType<ReadingsInput> =>
  z.strictObject({ regions, on: calendarDate.optional(), answers, readings, furtherPieces: readings, extracts, conditions });

/** Places in a list at which something stands that stood there before. */
function repeated<T>(list: readonly T[], keyOfOne: (one: T) => string): readonly number[] {
  const keys = list.map(keyOfOne);
  return keys.flatMap((key, place) => (keys.indexOf(key) < place ? [place] : []));
}
