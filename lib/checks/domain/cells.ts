import type { Millionths, Unit } from '@/lib/kernel/quantity';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Comparison, Test } from './condition-reading';
import { MOST_CELLS, type CompileFault, type Place } from './line-input';
import type { Question } from './questions';
import { cutRegion, type RegionCells } from './region-cells';

/** A line of numbers cut at k thresholds: 2k + 1 cells, open intervals and points by turns. */
export type Cuts = readonly Millionths[];

/** How one question is split into variables (`first` and those after it) and each variable into cells. */
export type QuestionCells =
  | { readonly kind: 'yesno'; readonly first: number }
  | { readonly kind: 'choice' | 'several'; readonly first: number; readonly options: readonly string[] }
  | { readonly kind: 'amount'; readonly first: number; readonly unit: Unit; readonly cuts: Cuts }
  | { readonly kind: 'money'; readonly first: number; readonly currencies: readonly string[]; readonly cuts: readonly Cuts[] }
  | RegionCells;

/** The variables of a line: how many cells each has, the mask of all of them, and the position of the question it belongs to. */
export type Variables = { readonly cells: Int32Array; readonly all: Int32Array; readonly question: Int32Array };

export type Space = { readonly byQuestion: readonly (QuestionCells | null)[]; readonly variables: Variables };

/** A test with the rule, term or gated question it comes from. */
export type OwnedTest = { readonly test: Test; readonly owner: string };

/** Splits the questions that are tested, each as finely as the tests need and no finer. */
export function cutSpace(
  questions: readonly Question[],
  tests: readonly OwnedTest[],
  places: readonly Place[],
): Result<Space, CompileFault> {
  const byQuestion: (QuestionCells | null)[] = [];
  const cells: number[] = [];
  const owners: number[] = [];
  for (const [at, question] of questions.entries()) {
    const own = tests.filter(({ test }) => test.question === at);
    const cut = own.length === 0 ? null : cutQuestion(question, own, { first: cells.length, places });
    byQuestion.push(cut);
    if (cut === null) continue;
    const sizes = sizesOf(cut);
    if (sizes.some((size) => size > MOST_CELLS)) {
      return err({ kind: 'too-many-cells', in: own.at(-1)?.owner ?? question.id, about: question.id });
    }
    cells.push(...sizes);
    owners.push(...sizes.map(() => at));
  }
  const all = Int32Array.from(cells, (count) => (1 << count) - 1);
  return ok({ byQuestion, variables: { cells: Int32Array.from(cells), all, question: Int32Array.from(owners) } });
}

type Start = { readonly first: number; readonly places: readonly Place[] };

function cutQuestion(question: Question, tests: readonly OwnedTest[], { first, places }: Start): QuestionCells {
  switch (question.kind) {
    case 'yesno':
      return { kind: 'yesno', first };
    case 'choice':
    case 'several':
      return { kind: question.kind, first, options: question.options };
    case 'amount':
      return { kind: 'amount', first, unit: question.unit, cuts: cutsIn(tests, null) };
    case 'money': {
      const currencies = [...new Set(tests.flatMap(({ test }) => (test.kind === 'compares' ? (test.currency ?? []) : [])))].sort();
      return { kind: 'money', first, currencies, cuts: currencies.map((currency) => cutsIn(tests, currency)) };
    }
    case 'region':
      return cutRegion(new Set(tests.flatMap(({ test }) => (test.kind === 'within' ? test.code : []))), places, first);
  }
}

function cutsIn(tests: readonly OwnedTest[], currency: string | null): Cuts {
  const at = tests.flatMap(({ test }) => (test.kind === 'compares' && test.currency === currency ? test.at : []));
  return [...new Set(at)].sort((a, b) => (a < b ? -1 : 1));
}

const sizeOf = (cuts: Cuts): number => 2 * cuts.length + 1;

function sizesOf(cut: QuestionCells): readonly number[] {
  switch (cut.kind) {
    case 'yesno':
      return [2];
    case 'choice':
      return [cut.options.length];
    case 'several':
      return cut.options.map(() => 2);
    case 'amount':
      return [sizeOf(cut.cuts)];
    case 'money':
      return cut.cuts.map(sizeOf);
    case 'region':
      return [cut.cells];
  }
}

/** The cell that an amount falls into. */
export function cellOfAmount(cuts: Cuts, amount: Millionths): number {
  const below = cuts.filter((cut) => cut < amount).length;
  return 2 * below + (cuts[below] === amount ? 1 : 0);
}

/** A variable and those of its cells in which a test holds. */
export type Literal = { readonly variable: number; readonly mask: number };

/** The test as literals of which one must hold. */
export function literalsOf(test: Test, cut: QuestionCells): readonly Literal[] {
  switch (test.kind) {
    case 'picks':
      return picked(test.options, cut);
    case 'compares':
      return compared(test, cut);
    case 'within':
      return [{ variable: cut.first, mask: cut.kind === 'region' ? (cut.within.get(test.code) ?? 0) : 0 }];
  }
}

function compared({ by, at, currency }: Extract<Test, { readonly kind: 'compares' }>, cut: QuestionCells): readonly Literal[] {
  if (cut.kind === 'amount') return [{ variable: cut.first, mask: maskOfComparison(cut.cuts, by, at) }];
  if (cut.kind !== 'money' || currency === null) return [];
  const place = cut.currencies.indexOf(currency);
  return [{ variable: cut.first + place, mask: maskOfComparison(cut.cuts[place] ?? [], by, at) }];
}

function picked(options: readonly number[], cut: QuestionCells): readonly Literal[] {
  if (cut.kind === 'several') return options.map((option) => ({ variable: cut.first + option, mask: 2 }));
  return [{ variable: cut.first, mask: options.reduce((mask, option) => mask | (1 << option), 0) }];
}

function maskOfComparison(cuts: Cuts, by: Comparison, at: Millionths): number {
  const point = cellOfAmount(cuts, at);
  const below = (1 << point) - 1;
  const upTo = below | (1 << point);
  const every = (1 << sizeOf(cuts)) - 1;
  switch (by) {
    case 'lt':
      return below;
    case 'le':
      return upTo;
    case 'gt':
      return every & ~upTo;
    case 'ge':
      return every & ~below;
  }
}
