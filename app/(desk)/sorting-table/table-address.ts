import type { WaitingQuery } from '@/lib/regions/amendment-schema';

/** What the sorting table is narrowed and sorted by, as a query: empty where nothing is asked. */
export function tableQuery({ region, state, days, sort }: WaitingQuery, over: { readonly sort?: WaitingQuery['sort'] } = {}): string {
  const asked = { region, state, days, sort, ...over };
  const kept = Object.entries(asked).flatMap(([name, value]) => (value === undefined ? [] : [[name, String(value)]]));
  return new URLSearchParams(kept).toString();
}

/** Only a part of what waits is asked for. */
export const isNarrowed = ({ region, state, days }: WaitingQuery): boolean =>
  region !== undefined || state !== undefined || days !== undefined;
