import { decimalOf } from '@/lib/kernel/decimal';
import { product, quotient, readFraction, type Fraction } from '@/lib/kernel/fraction';
import type { LimitPayload } from './rule';

export type SharedAmount = { readonly value: string; readonly unit: string };

type Factor = readonly [upper: bigint, lower: bigint];

/**
 * How units of one kind turn into the one we compare in, where that is exact by definition. Parts per million of a test liquid stand
 * on its density and are left as the source gives them; of a mass they are milligrams a kilogram.
 */
const SHARED: Readonly<Record<LimitPayload['per'], { readonly unit: string; readonly of: Readonly<Record<string, Factor>> }>> = {
  L: { unit: 'mg/L', of: { 'ug/mL': [1n, 1n], 'ug/L': [1n, 1000n] } },
  dm2: { unit: 'mg/dm2', of: { 'ug/cm2': [1n, 10n], 'ug/dm2': [1n, 1000n] } },
  article: { unit: 'mg/article', of: { 'ug/article': [1n, 1000n] } },
  kg: { unit: 'mg/kg', of: { ppm: [1n, 1n], percent: [10_000n, 1n] } },
};

/** The limit's figure in the shared unit of its kind, exact. Null where it stands in that unit already, or cannot be turned exactly. */
export function sharedAmount({ amount, per }: Pick<LimitPayload, 'amount' | 'per'>): SharedAmount | null {
  const { unit, of } = SHARED[per];
  const factor = of[amount.unit];
  const value = readFraction(amount.value);
  const by: Fraction | null = factor === undefined ? null : quotient(factor[0], factor[1]);
  return value === null || by === null ? null : { value: decimalOf(product(value, by)), unit };
}
