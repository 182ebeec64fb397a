import type { Place } from './line-input';

/** Places told apart as far as the rules do. Each cell is the set of named codes that a place lies within. */
export type RegionCells = {
  readonly kind: 'region';
  readonly first: number;
  /** Number of cells. */
  readonly cells: number;
  /** The cells within each code that a rule names. */
  readonly within: ReadonlyMap<string, number>;
  /** The cells an answer leaves possible, by code. */
  readonly placed: ReadonlyMap<string, number>;
  /** The cell of every place that is neither listed nor named. */
  readonly elsewhere: number;
};

/** A bloc such as "eu" or "anz" is no country: whoever names it may be in any of its members. */
const isBloc = (code: string): boolean => code === 'eu' || (code.length > 2 && !code.includes('-'));

/** Cuts a region question along the codes that rules name. */
export function cutRegion(named: ReadonlySet<string>, places: readonly Place[], first: number): RegionCells {
  const codes = [...named].sort();
  const lines = linesOf(codes, places);
  const signatureOf = (line: ReadonlySet<string>): string => codes.map((code) => (line.has(code) ? '1' : '0')).join('');
  const nowhere = signatureOf(new Set());
  const signatures = [...new Set([nowhere, ...[...lines.values()].map(signatureOf)])].sort();
  const cellOf = (line: ReadonlySet<string>): number => 1 << signatures.indexOf(signatureOf(line));
  const within = codes.map((code, at): readonly [string, number] => [code, cellsWith(signatures, at)]);
  return {
    kind: 'region',
    first,
    cells: signatures.length,
    within: new Map(within),
    placed: placedOf(lines, cellOf),
    elsewhere: 1 << signatures.indexOf(nowhere),
  };
}

/** The cells that an answered code leaves possible. A part that is not listed counts as its country. */
export function cellsOfPlace(cells: RegionCells, code: string): number {
  return cells.placed.get(code) ?? cells.placed.get(code.split('-')[0] ?? code) ?? cells.elsewhere;
}

/** Every listed place with its line; a code that rules name and nobody lists is a place of its own. */
function linesOf(codes: readonly string[], places: readonly Place[]): ReadonlyMap<string, ReadonlySet<string>> {
  const lines = new Map<string, ReadonlySet<string>>(codes.map((code) => [code, new Set([code])]));
  for (const { code, line } of places) lines.set(code, new Set([...line, code]));
  return lines;
}

const cellsWith = (signatures: readonly string[], at: number): number =>
  signatures.reduce((mask, signature, cell) => (signature[at] === '1' ? mask | (1 << cell) : mask), 0);

function placedOf(
  lines: ReadonlyMap<string, ReadonlySet<string>>,
  cellOf: (line: ReadonlySet<string>) => number,
): ReadonlyMap<string, number> {
  const placed = new Map<string, number>();
  for (const [code, line] of lines) placed.set(code, cellOf(line));
  for (const line of lines.values()) {
    // A member that no sheet describes is possible too, hence the bloc's own cell beside those of its members.
    for (const code of line) {
      if (isBloc(code)) placed.set(code, (placed.get(code) ?? cellOf(new Set([code]))) | cellOf(line));
    }
  }
  return placed;
}
