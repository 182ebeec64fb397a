import { answersInput } from '@/lib/checks/schema';
import { readFraction, whole, type Fraction } from '@/lib/kernel/fraction';
import type { Answers } from '@/lib/checks/domain/knowledge';
import type { Reading, Report } from '@/lib/readings/domain/reading';

/** A fraction known to be one. */
export const exactly = (value: number | string): Fraction => readFraction(value) ?? whole(-1n);

/** One reading of lead in mg/L from the vessel of piece A, but for what is told. */
export const aReading = (told: Partial<Omit<Reading, 'value'>> & { readonly value: number | string | Fraction }): Reading => ({
  specimen: 'A',
  part: 'vessel',
  substance: 'Pb',
  unit: 'mg/L',
  below: false,
  ...told,
  value: typeof told.value === 'object' ? told.value : exactly(told.value),
});

export const aReport = (told: Partial<Report>): Report => ({ readings: [], furtherPieces: [], extracts: [], conditions: {}, ...told });

export const answersOf = (answers: unknown): Answers => answersInput.parse(answers);
