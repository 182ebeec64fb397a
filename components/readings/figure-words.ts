import { words, wordsAt } from '@/lib/kernel/words';
import type { SheetRow } from '@/lib/readings/domain/row-words';

export { saySubstance } from '@/lib/regions/domain/figure-words';

/** The unit as it is written: "µg/mL". */
export const sayUnitName = (unit: string): string => wordsAt(`regions.unit.${unit}`) ?? unit;

/** "Vessel". A part that a report cannot name, such as a metal part, has its words with the verdicts. */
export const sayRowPart = (part: string): string => wordsAt(`readings-page.rows.part.${part}`) ?? wordsAt(`readings.part.${part}`) ?? part;

/** "0.31 mg/L", "below 0.01 mg/L": the decimal as it was read, no digit taken off. */
export function sayRowFigure({ value, unit, below }: Pick<SheetRow, 'value' | 'unit' | 'below'>): string {
  return words(below ? 'readings-page.figure.below' : 'readings-page.figure.exact', { value, unit: sayUnitName(unit) });
}

type Figure = { readonly value: number | string; readonly unit: string };

/** A figure that was compared with a limit; one that rests on readings below detection is the most there can be. */
export function sayCompared({ value, unit }: Figure, below: boolean): string {
  return words(below ? 'readings-page.figure.atMost' : 'readings-page.figure.exact', { value: String(value), unit: sayUnitName(unit) });
}
