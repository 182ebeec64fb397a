import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { RegionLine } from './line';
import { limitRows, type LimitRow } from './limit-rows';
import { namesOf } from './sheet-names';
import type { SheetLayer } from './told-sheet';

/** A place with the sheets it is read from, general to local, itself last. */
export type PlaceLine = { readonly line: RegionLine; readonly layers: readonly SheetLayer[] };

/** Where a substance is limited: every limit under the place whose sheet holds it. */
export type SubstanceLimits = {
  readonly places: readonly { readonly code: string; readonly name: string; readonly rows: readonly LimitRow[] }[];
  /** Places without a limit of their own that take over those of the layers above, named from general to local. */
  readonly above: readonly { readonly code: string; readonly name: string; readonly layers: readonly string[] }[];
  /** Places where we found no limit at all. Not the same as none. */
  readonly notFound: readonly { readonly code: string; readonly name: string }[];
};

/** Collects the limits on one substance over some places on a day. */
export function substanceLimits(lines: readonly PlaceLine[], symbol: string, on: CalendarDate): SubstanceLimits {
  const found = lines.flatMap((place) => placeOf(place, symbol, on));
  return {
    places: found.filter(({ rows }) => rows.length > 0).map(({ code, name, rows }) => ({ code, name, rows })),
    above: found
      .filter(({ rows, layers }) => rows.length === 0 && layers.length > 0)
      .map(({ code, name, layers }) => ({ code, name, layers })),
    notFound: found.filter(({ rows, layers }) => rows.length === 0 && layers.length === 0).map(({ code, name }) => ({ code, name })),
  };
}

/** Every limit in a place's line on that day, its own first. A place without a sheet has none. */
export function limitsOfLine({ line, layers }: PlaceLine, on: CalendarDate): readonly LimitRow[] {
  const own = layers.at(-1);
  if (own === undefined) return [];
  const sheet = { ...own, on, line: line.layers, notInherited: line.except, above: layers.slice(0, -1), caution: '' };
  return limitRows(sheet, namesOf(layers));
}

type Found = {
  readonly code: string;
  readonly name: string;
  readonly rows: readonly LimitRow[];
  readonly layers: readonly string[];
};

function placeOf({ line, layers }: PlaceLine, symbol: string, on: CalendarDate): readonly Found[] {
  const own = layers.at(-1);
  if (own === undefined) return [];
  const rows = limitsOfLine({ line, layers }, on).filter(({ limit }) => limit.substance === symbol);
  const above = layers.slice(0, -1).filter(({ code }) => rows.some(({ rule }) => rule.region === code));
  return [
    {
      code: own.code,
      name: own.name,
      rows: rows.filter(({ rule }) => rule.region === own.code),
      layers: above.map(({ name }) => name),
    },
  ];
}
