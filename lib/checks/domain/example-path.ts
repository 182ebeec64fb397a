import { answerFrom, cellValues, type CellValue, type Piece } from './cell-values';
import type { Space } from './cells';
import { LEAVES, lowestBit, type Diagram } from './diagram';
import type { Answers } from './knowledge';
import type { Question } from './questions';

type Way = { readonly cost: number; readonly value: CellValue | null };

/** Finds answers under which a diagram says yes. Ways are kept from one node to the next: each node is looked at once. */
export class ExamplePaths {
  private readonly ways = new Map<number, Way>();
  private readonly values = new Map<number, readonly CellValue[]>();

  constructor(
    private readonly diagram: Diagram,
    private readonly space: Space,
    private readonly questions: readonly Question[],
  ) {}

  /** The fewest real answers that make the node yes, whatever else is answered; null where no real answers do. */
  answersTo(node: number): Answers | null {
    if (this.wayFrom(node).cost === Infinity) return null;
    const pieces = new Map<number, Map<number, Piece>>();
    let at = node;
    for (let { value } = this.wayFrom(at); value !== null; { value } = this.wayFrom(at)) {
      const variable = this.diagram.variable[at]!;
      const place = this.space.variables.question[variable]!;
      const own = pieces.get(place) ?? new Map<number, Piece>();
      own.set(variable - (this.space.byQuestion[place]?.first ?? 0), value.piece);
      pieces.set(place, own);
      at = this.childOf(at, value);
    }
    return this.answersFrom(pieces);
  }

  private wayFrom(node: number): Way {
    if (node < LEAVES) return { cost: node === 1 ? 0 : Infinity, value: null };
    const known = this.ways.get(node);
    if (known !== undefined) return known;
    let best: Way = { cost: Infinity, value: null };
    for (const value of this.valuesOf(this.diagram.variable[node]!)) {
      const cost = 1 + this.wayFrom(this.childOf(node, value)).cost;
      if (cost < best.cost) best = { cost, value };
    }
    this.ways.set(node, best);
    return best;
  }

  private childOf(node: number, { mask }: CellValue): number {
    return this.diagram.child[this.diagram.first[node]! + lowestBit(mask)]!;
  }

  private valuesOf(variable: number): readonly CellValue[] {
    const known = this.values.get(variable);
    if (known !== undefined) return known;
    const cut = this.space.byQuestion[this.space.variables.question[variable]!];
    const made = cut === null || cut === undefined ? [] : cellValues(cut, variable - cut.first);
    this.values.set(variable, made);
    return made;
  }

  private answersFrom(pieces: ReadonlyMap<number, ReadonlyMap<number, Piece>>): Answers {
    const answers = [...pieces].flatMap(([place, own]) => {
      const cut = this.space.byQuestion[place];
      const id = this.questions[place]?.id;
      const answer = cut === null || cut === undefined ? null : answerFrom(cut, own);
      return id === undefined || answer === null ? [] : [[id, answer] as const];
    });
    return Object.fromEntries(answers);
  }
}
