import type { Variables } from './cells';
import { LEAVES, type Diagram } from './diagram';

/** Of all combinations of cells, those in which something is so. Whole numbers as text: they outgrow a double. */
export type Share = { readonly cases: string; readonly of: string; readonly percent: string };

/** How large a part of the combinations a node says yes to, among the variables that any of `nodes` tests. */
export function shareOf(diagram: Diagram, variables: Variables, { node, nodes }: { node: number; nodes: readonly number[] }): Share {
  const among = [...variablesBelow(diagram, variables, [...nodes, node])].sort((a, b) => a - b);
  const cases = new Counter(diagram, variables, among).count(node);
  const of = among.reduce((product, variable) => product * BigInt(variables.cells[variable]!), 1n);
  return { cases: String(cases), of: String(of), percent: percentOf(cases, of) };
}

function variablesBelow(diagram: Diagram, variables: Variables, nodes: readonly number[]): ReadonlySet<number> {
  const seen = new Set<number>();
  const found = new Set<number>();
  const walk = (node: number): void => {
    if (node < LEAVES || seen.has(node)) return;
    seen.add(node);
    const variable = diagram.variable[node]!;
    found.add(variable);
    for (let cell = 0; cell < variables.cells[variable]!; cell += 1) walk(diagram.child[diagram.first[node]! + cell]!);
  };
  for (const node of nodes) walk(node);
  return found;
}

/** Counts combinations of the variables from a node's own onwards; those that a branch skips multiply it. */
class Counter {
  private readonly memo = new Map<number, bigint>();
  private readonly place: ReadonlyMap<number, number>;
  /** Combinations of the variables from a place on. */
  private readonly from: readonly bigint[];

  constructor(
    private readonly diagram: Diagram,
    private readonly variables: Variables,
    among: readonly number[],
  ) {
    this.place = new Map(among.map((variable, place) => [variable, place]));
    const from = [1n];
    for (const variable of among.toReversed()) from.unshift((from[0] ?? 1n) * BigInt(variables.cells[variable]!));
    this.from = from;
  }

  /** Combinations of all variables in which the node says yes. */
  count(node: number): bigint {
    return this.below(node, 0);
  }

  private below(node: number, place: number): bigint {
    const own = this.placeOf(node);
    return (this.sum(node) * this.after(place)) / this.after(own);
  }

  private sum(node: number): bigint {
    if (node < LEAVES) return BigInt(node);
    const known = this.memo.get(node);
    if (known !== undefined) return known;
    const next = this.placeOf(node) + 1;
    let sum = 0n;
    const count = this.variables.cells[this.diagram.variable[node]!]!;
    for (let cell = 0; cell < count; cell += 1) sum += this.below(this.diagram.child[this.diagram.first[node]! + cell]!, next);
    this.memo.set(node, sum);
    return sum;
  }

  private placeOf(node: number): number {
    return node < LEAVES ? this.from.length - 1 : (this.place.get(this.diagram.variable[node]!) ?? 0);
  }

  private after(place: number): bigint {
    return this.from[place] ?? 1n;
  }
}

/** In per cent with one decimal, two digits where it is less than one; never 0 for some, never 100 for not all. */
function percentOf(cases: bigint, of: bigint): string {
  if (cases === 0n || cases === of) return cases === 0n ? '0' : '100';
  if (100n * cases < of) return smallPercent(cases, of);
  const tenths = (1000n * cases + of / 2n) / of;
  const shown = tenths > 999n ? 999n : tenths;
  return shown % 10n === 0n ? String(shown / 10n) : `${String(shown / 10n)}.${String(shown % 10n)}`;
}

function smallPercent(cases: bigint, of: bigint): string {
  let scale = 1000n;
  let places = 1;
  while (scale * cases < 10n * of) {
    scale *= 10n;
    places += 1;
  }
  const digits = String((scale * cases + of / 2n) / of).padStart(places + 1, '0');
  return `${digits.slice(0, -places)}.${digits.slice(-places)}`.replace(/\.?0+$/, '');
}
