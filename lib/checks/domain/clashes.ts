import type { EngineRule, LineInput } from './line-input';
import type { CompiledLine } from './line';
import { LEAVES, type Diagram } from './diagram';

/** Two rules that replace the same active rule although neither attacks the other, with a piece to which both would apply. */
export type Clash = { readonly rules: readonly [lower: string, higher: string]; readonly target: string };

/** The clashes of a line: pairs marked as standing beside each other are none. */
export function clashesIn(line: CompiledLine, { layers }: Pick<LineInput, 'layers'>): readonly Clash[] {
  const kinds = new Map(layers.flatMap(({ rules }) => rules.map(({ id, kind }): readonly [string, EngineRule['kind']] => [id, kind])));
  const together = new Together(line.diagram, line.variables.cells);
  return line.rules.flatMap(({ id: target, attackers }) => {
    const replacing = attackers.filter((rank) => kinds.get(line.rules[rank]?.id ?? '') === 'replaces');
    return replacing.flatMap((higher, place) =>
      replacing.slice(0, place).flatMap((lower): readonly Clash[] => {
        const [a, b] = [line.rules[lower], line.rules[higher]];
        if (a === undefined || b === undefined || a.attackers.includes(higher) || a.disagrees.includes(higher)) return [];
        return together.canBoth(a.node, b.node) ? [{ rules: [a.id, b.id], target }] : [];
      }),
    );
  });
}

/** Whether two nodes can hold at once. Walks both diagrams side by side, each pair of nodes once. */
class Together {
  private readonly known = new Map<number, boolean>();

  constructor(
    private readonly diagram: Diagram,
    private readonly cells: Int32Array,
  ) {}

  canBoth(a: number, b: number): boolean {
    if (a === 0 || b === 0) return false;
    // A node that is no leaf holds somewhere: the diagrams are reduced.
    if (a === 1 || b === 1 || a === b) return true;
    const key = Math.min(a, b) * this.diagram.size + Math.max(a, b);
    const found = this.known.get(key) ?? this.below(a, b);
    this.known.set(key, found);
    return found;
  }

  private below(a: number, b: number): boolean {
    const variable = Math.min(this.diagram.variable[a] ?? 0, this.diagram.variable[b] ?? 0);
    const count = this.cells[variable] ?? 0;
    for (let cell = 0; cell < count; cell += 1) {
      if (this.canBoth(this.child(a, variable, cell), this.child(b, variable, cell))) return true;
    }
    return false;
  }

  private child(node: number, variable: number, cell: number): number {
    const { variable: tested, first, child } = this.diagram;
    if (node < LEAVES || tested[node] !== variable) return node;
    return child[(first[node] ?? 0) + cell] ?? 0;
  }
}
