import { readFraction, type Fraction } from '@/lib/kernel/fraction';
import type { LimitPayload } from '@/lib/regions/domain/rule';

/** What an amount is a share of: a litre or a square decimetre of extract, a piece, a kilogram of the piece. */
export type Per = LimitPayload['per'];

/** Factors to mg/L, mg/dm2, mg a piece and mg/kg. A part per million of extract is a milligram in a litre. */
const FACTORS: Readonly<Record<Per, Readonly<Record<string, string>>>> = {
  L: { 'mg/l': '1', 'ug/ml': '1', 'ug/l': '0.001', ppm: '1', ppb: '0.001' },
  dm2: { 'mg/dm2': '1', 'ug/cm2': '0.1', 'ug/dm2': '0.001' },
  article: { 'mg/article': '1', 'ug/article': '0.001' },
  kg: { 'mg/kg': '1', '%': '10000', percent: '10000', ppm: '1', ppb: '0.001' },
};
const RELEASE: readonly Per[] = ['L', 'dm2', 'article', 'kg'];
const CONTENT: readonly Per[] = ['kg', 'L', 'dm2', 'article'];

/** One spelling for each unit: lower case, "u" for every sign of a millionth, plain digits. */
const plain = (unit: string): string => unit.normalize('NFKC').trim().toLowerCase().replaceAll('μ', 'u');

/** Units as they are told to somebody whose unit was not understood. */
export const UNITS: readonly string[] = ['mg/L', 'ug/mL', 'ug/L', 'ppm', 'ppb', 'mg/dm2', 'ug/cm2', 'mg/article', '%', 'mg/kg'];

export const isKnownUnit = (unit: string): boolean => RELEASE.some((per) => factorOf(unit, per) !== null);

/** By what an amount in `unit` is multiplied to be in milligrams per `per`. Null where the unit is none of that kind. */
export function factorOf(unit: string, per: Per): Fraction | null {
  const table = FACTORS[per];
  const key = plain(unit);
  const factor = Object.hasOwn(table, key) ? table[key] : undefined;
  return factor === undefined ? null : readFraction(factor);
}

/** What a reading's unit is per: "ppm" is of mass for the content of a piece and of extract everywhere else. */
export function perOf(unit: string, part: string): Per | null {
  return (part === 'content' ? CONTENT : RELEASE).find((per) => factorOf(unit, per) !== null) ?? null;
}
