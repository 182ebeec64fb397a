import { LOCALE } from '@/lib/kernel/words';

const KILO = 1000;
const UNITS = ['byte', 'kilobyte', 'megabyte'] as const;

/** "412 kB": the size of a file, to three figures. */
export function sayBytes(bytes: number): string {
  const power = bytes < KILO ? 0 : bytes < KILO * KILO ? 1 : 2;
  const format = new Intl.NumberFormat(LOCALE, { style: 'unit', unit: UNITS[power], unitDisplay: 'short', maximumSignificantDigits: 3 });
  return format.format(bytes / KILO ** power);
}
