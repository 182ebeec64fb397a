import { LOCALE } from '@/lib/kernel/words';
import type { ListedRegion } from './listed-region';
import { placeWords } from './condition-words';

/** How far a country is covered, the best first. */
export const COVERAGE = ['read', 'to-confirm', 'no-limits', 'no-sheet'] as const;
export type Coverage = (typeof COVERAGE)[number];

export type CoveredCountry = { readonly code: string; readonly name: string; readonly state: Coverage };

const STATES = { read: 'read', 'to-confirm': 'to-confirm', none: 'no-limits' } as const;
const BY_NAME = new Intl.Collator(LOCALE, { sensitivity: 'base' });

/**
 * The state of every country of ISO 3166-1, by name. A country's line counts, so that a member of a bloc has at least what
 * the bloc has; a country without a sheet of its own has none, whatever its neighbours have.
 */
export function coverageOf(countries: readonly string[], regions: readonly ListedRegion[]): readonly CoveredCountry[] {
  const known = new Map(regions.map((region) => [region.code, region]));
  return countries
    .map((code): CoveredCountry => {
      const region = known.get(code);
      const name = region?.name ?? placeWords(code);
      return { code, name, state: region === undefined ? 'no-sheet' : STATES[region.limits] };
    })
    .sort((a, b) => BY_NAME.compare(a.name, b.name));
}

/** How many countries stand in each state. */
export function countCoverage(countries: readonly CoveredCountry[]): Readonly<Record<Coverage, number>> {
  const count = (state: Coverage): number => countries.filter((country) => country.state === state).length;
  return { read: count('read'), 'to-confirm': count('to-confirm'), 'no-limits': count('no-limits'), 'no-sheet': count('no-sheet') };
}
