import { LOCALE, words, wordsAt } from '@/lib/kernel/words';
import type { Decision, LimitPayload, Tolerance } from './rule';

/** Figures as the source gives them: no rounding, decimal point, thin groups of three. */
const FIGURE = new Intl.NumberFormat(LOCALE, { maximumFractionDigits: 12 });

export const sayFigure = (value: number): string => FIGURE.format(value);

/** "62 mm", "1.5 %": the number and its unit on one line. A unit without words of its own stands as it is. */
export function sayUnit(value: number, unit: string): string {
  const said = wordsAt(`regions.unit.${unit}`) ?? unit;
  return words('regions.figure', { value: sayFigure(value), unit: said });
}

/** "€10,000", "DKK 50,000". `amount` is an exact decimal. */
export function sayMoney(amount: string, currency: string): string {
  const places = amount.split('.')[1]?.length ?? 0;
  const format = new Intl.NumberFormat(LOCALE, {
    style: 'currency',
    currency,
    minimumFractionDigits: places,
    maximumFractionDigits: places,
  });
  return format.format(Number(amount));
}

/** "22 °C, give or take 2 °C"; without the second half where there is none. */
export function sayTolerance({ value, plusMinus }: Tolerance, unit: string): string {
  if (plusMinus === 0) return sayUnit(value, unit);
  return words('regions.tolerance', { value: sayUnit(value, unit), margin: sayUnit(plusMinus, unit) });
}

/** "Lead (Pb)". */
export function saySubstance(symbol: string): string {
  const name = wordsAt(`regions.substance.${symbol}`);
  return name === null ? symbol : words('regions.substanceOf', { name, symbol });
}

/** Of what the limit is a share, with the part of the piece: "from the inside, in each litre of test liquid". */
export function sayPart({ part, per }: Pick<LimitPayload, 'part' | 'per'>): string {
  return words('regions.limit.where', { part: words(`regions.limit.part.${part}`), per: words(`regions.limit.per.${per}`) });
}

/** The figure with the side on which the limit itself lies: "at most 4 mg/L", "less than 4 mg/L", or that the texts differ. */
export function sayLimit({ amount, decision }: Pick<LimitPayload, 'amount' | 'decision'>): string {
  return words(`regions.limit.${decision.atLimit}`, { amount: sayUnit(amount.value, amount.unit) });
}

/** How a lab's figures are held against the limit, in whole sentences. */
export function sayDecision({ kind, specimens, atLimit }: Omit<Decision, 'evidence'>): readonly string[] {
  return [words(`regions.decision.${kind}`, { count: specimens }), words(`regions.atLimit.${atLimit}`)];
}
