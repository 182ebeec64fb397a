import 'server-only';
import type { Ctx } from '@/lib/server/ctx';
import { countryCodes, worldMap, type CountryShape } from '@/lib/server/world-map';
import { coverageOf, type CoveredCountry } from './domain/coverage';
import { listRegions } from './list-regions';

export type WorldCoverage = { readonly countries: readonly CoveredCountry[]; readonly shapes: readonly CountryShape[] };

/** How far each country of the world is covered today, with its outline for the map. */
export async function listCoverage(ctx: Ctx): Promise<WorldCoverage> {
  return { countries: coverageOf(countryCodes, await listRegions(ctx)), shapes: worldMap() };
}
