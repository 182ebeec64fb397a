import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { LimitRow } from './limit-rows';
import { foldText } from './region-search';
import { sharedAmount, type SharedAmount } from './shared-unit';
import { limitsOfLine, type PlaceLine } from './substance-limits';

/** Kinds of ware that places draw alike enough to stand in one row, in the order of a table. Each place draws its own border. */
export const WARES = [
  'flat',
  'hollow',
  'small-hollow',
  'large-hollow',
  'cup',
  'pitcher',
  'storage',
  'cooking-storage',
  'cooking',
  'any',
  'rim',
  'metal-part',
  'material',
] as const;
export type Ware = (typeof WARES)[number];

/** What a category's id ends on, after the code of its place. */
const ENDINGS: Readonly<Record<string, Ware>> = {
  flat: 'flat',
  shallow: 'flat',
  hollow: 'hollow',
  'small-hollow': 'small-hollow',
  'deep-small': 'small-hollow',
  'large-hollow': 'large-hollow',
  'deep-medium': 'large-hollow',
  'deep-large': 'large-hollow',
  'cup-mug': 'cup',
  cup: 'cup',
  drinking: 'cup',
  mouth: 'cup',
  pitcher: 'pitcher',
  storage: 'storage',
  'cooking-storage': 'cooking-storage',
  cooking: 'cooking',
  cookware: 'cooking',
  heating: 'cooking',
  'heating-deep': 'cooking',
  'heating-shallow': 'cooking',
};

/** A limit of a place in a row. `shared`: the same figure in the unit we compare in, where that is another one. */
export type ComparedLimit = { readonly row: LimitRow; readonly shared: SharedAmount | null };

/** `name` is a place's own word for a kind of ware that fits no row of ours. */
export type ComparedRow = {
  readonly id: string;
  readonly ware: Ware | null;
  readonly name: string;
  readonly cells: Readonly<Record<string, readonly ComparedLimit[]>>;
};

export type ComparedPlace = { readonly code: string; readonly name: string; readonly layers: ReadonlyMap<string, string> };
export type LimitComparison = { readonly places: readonly ComparedPlace[]; readonly rows: readonly ComparedRow[] };

type Placed = {
  readonly id: string;
  readonly ware: Ware | null;
  readonly name: string;
  readonly code: string;
  readonly limit: ComparedLimit;
};

/** The limits on one substance in some places, kind of ware by kind of ware. In the order of the places; nothing is ranked. */
export function compareLimits(lines: readonly PlaceLine[], symbol: string, on: CalendarDate): LimitComparison {
  const known = lines.flatMap((line) => {
    const own = line.layers.at(-1);
    return own === undefined ? [] : [{ line, own }];
  });
  const placed = known.flatMap(({ line, own }) =>
    limitsOfLine(line, on)
      .filter(({ limit }) => limit.substance === symbol)
      .flatMap((row) => rowsOf(row).map((where) => ({ ...where, code: own.code, limit: { row, shared: sharedAmount(row.limit) } }))),
  );
  const places = known.map(({ line, own }) => ({
    code: own.code,
    name: own.name,
    layers: new Map(line.layers.map(({ code, name }) => [code, name])),
  }));
  return { places, rows: gathered(placed) };
}

/** Where a limit stands: by the part of the piece it speaks of, else by each kind of ware it names. */
function rowsOf({ limit, categories }: LimitRow): readonly Omit<Placed, 'code' | 'limit'>[] {
  const byPart = wareOfPart(limit);
  if (byPart !== null) return [{ id: byPart, ware: byPart, name: '' }];
  if (categories.length === 0) return [{ id: 'any', ware: 'any', name: '' }];
  return categories.map(({ id, name, region }) => {
    const ware = id.startsWith(`${region}-`) ? (ENDINGS[id.slice(region.length + 1)] ?? null) : null;
    return { id: ware ?? `term-${id}`, ware, name: ware === null ? name : '' };
  });
}

function wareOfPart({ part, per }: LimitRow['limit']): Ware | null {
  if (part === 'rim' || part === 'metal-part') return part;
  return per === 'kg' ? 'material' : null;
}

function gathered(placed: readonly Placed[]): readonly ComparedRow[] {
  const rows = new Map<string, { ware: Ware | null; name: string; cells: Record<string, ComparedLimit[]> }>();
  for (const { id, ware, name, code, limit } of placed) {
    const row = rows.get(id) ?? { ware, name, cells: {} };
    rows.set(id, row);
    const cell = (row.cells[code] ??= []);
    if (!cell.some((one) => one.row.rule.id === limit.row.rule.id)) cell.push(limit);
  }
  const place = (ware: Ware | null): number => (ware === null ? WARES.length : WARES.indexOf(ware));
  return [...rows].map(([id, row]) => ({ id, ...row })).sort((a, b) => place(a.ware) - place(b.ware) || (a.id < b.id ? -1 : 1));
}

/** Rows of which each word asked for begins a word, in our name for the kind of ware or a place's own. No words keep all. */
export function rowsNamed(rows: readonly ComparedRow[], asked: string, nameOf: (row: ComparedRow) => string): readonly ComparedRow[] {
  const sought = foldText(asked)
    .split(' ')
    .filter((word) => word !== '');
  return rows.filter((row) => {
    const own = Object.values(row.cells).flatMap((cell) => cell.flatMap((limit) => limit.row.categories.map(({ name }) => name)));
    const known = foldText([nameOf(row), ...own].join(' ')).split(' ');
    return sought.every((word) => known.some((one) => one.startsWith(word)));
  });
}
