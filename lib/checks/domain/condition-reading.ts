import { baseUnit, isCurrency, millionths, type Millionths } from '@/lib/kernel/quantity';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Condition, Threshold } from '@/lib/regions/domain/condition';
import { MOST_LEVELS, type CompileFault } from './line-input';
import type { Question } from './questions';

export type Comparison = 'lt' | 'le' | 'gt' | 'ge';

/** A leaf that was found to fit its question. `question` is a position in the list of questions. */
export type Test =
  | { readonly kind: 'picks'; readonly question: number; readonly options: readonly number[] }
  | {
      readonly kind: 'compares';
      readonly question: number;
      readonly by: Comparison;
      readonly at: Millionths;
      readonly currency: string | null;
    }
  | { readonly kind: 'within'; readonly question: number; readonly code: string };

/**
 * A condition with its questions and terms looked up, and how each was written; `term` is a position in the line's list of terms.
 */
export type Reading =
  | { readonly kind: 'always'; readonly holds: boolean }
  | { readonly kind: 'all' | 'any'; readonly parts: readonly Reading[] }
  | { readonly kind: 'not'; readonly part: Reading }
  | { readonly kind: 'test'; readonly test: Test; readonly leaf: Condition }
  | { readonly kind: 'term'; readonly term: number; readonly id: string };

export type ReadFault = Pick<CompileFault, 'kind' | 'about'>;

/** What the names in a condition mean where it stands. */
export type Scope = {
  readonly questions: readonly Question[];
  readonly placeOf: ReadonlyMap<string, number>;
  readonly termOf: (id: string) => number | null;
};

type Leaf = Extract<Condition, { readonly question: string }>;

/** Looks up every name in a condition and checks every leaf against its question. */
export function readCondition(condition: Condition, scope: Scope, level = 1): Result<Reading, ReadFault> {
  if (level > MOST_LEVELS) return err({ kind: 'bad-test' });
  if (typeof condition === 'boolean') return ok({ kind: 'always', holds: condition });
  if ('all' in condition) return readParts('all', condition.all, { scope, level });
  if ('any' in condition) return readParts('any', condition.any, { scope, level });
  if ('not' in condition) return readNot(condition.not, { scope, level });
  return 'term' in condition ? readTerm(condition.term, scope) : readLeaf(condition, scope);
}

type At = { readonly scope: Scope; readonly level: number };

function readParts(kind: 'all' | 'any', conditions: readonly Condition[], { scope, level }: At): Result<Reading, ReadFault> {
  const parts: Reading[] = [];
  for (const condition of conditions) {
    const part = readCondition(condition, scope, level + 1);
    if (!part.ok) return part;
    parts.push(part.value);
  }
  return ok({ kind, parts });
}

function readNot(condition: Condition, { scope, level }: At): Result<Reading, ReadFault> {
  const part = readCondition(condition, scope, level + 1);
  return part.ok ? ok({ kind: 'not', part: part.value }) : part;
}

function readTerm(id: string, { termOf }: Scope): Result<Reading, ReadFault> {
  const term = termOf(id);
  return term === null ? err({ kind: 'unknown-term', about: id }) : ok({ kind: 'term', term, id });
}

function readLeaf(leaf: Leaf, scope: Scope): Result<Reading, ReadFault> {
  const test = readTest(leaf, scope);
  return test.ok ? ok({ kind: 'test', test: test.value, leaf }) : test;
}

/** A leaf as a test of its question, or the fault that keeps it from being one. */
export function readTest(leaf: Leaf, scope: Pick<Scope, 'questions' | 'placeOf'>): Result<Test, ReadFault> {
  const place = scope.placeOf.get(leaf.question);
  const question = place === undefined ? undefined : scope.questions[place];
  if (place === undefined || question === undefined) return err({ kind: 'unknown-question', about: leaf.question });
  const test = testOf(leaf, question, place);
  return test === null ? err({ kind: 'bad-test', about: leaf.question }) : ok(test);
}

function testOf(leaf: Leaf, question: Question, place: number): Test | null {
  switch (question.kind) {
    case 'yesno':
      return 'is' in leaf && typeof leaf.is === 'boolean' ? { kind: 'picks', question: place, options: [leaf.is ? 1 : 0] } : null;
    case 'choice':
    case 'several':
      return picksOf(leaf, question.options, place);
    case 'amount':
    case 'money':
      return comparesOf(leaf, question, place);
    case 'region':
      return 'within' in leaf ? { kind: 'within', question: place, code: leaf.within } : null;
  }
}

function picksOf(leaf: Leaf, options: readonly string[], question: number): Test | null {
  const wanted: readonly (string | boolean)[] | null = 'in' in leaf ? leaf.in : 'is' in leaf ? [leaf.is] : null;
  if (wanted === null) return null;
  const places = wanted.map((option) => (typeof option === 'string' ? options.indexOf(option) : -1));
  return places.includes(-1) ? null : { kind: 'picks', question, options: places };
}

function comparesOf(leaf: Leaf, question: Extract<Question, { readonly kind: 'amount' | 'money' }>, place: number): Test | null {
  const bound = boundOf(leaf);
  if (bound === null) return null;
  const [by, { value, unit }] = bound;
  const fits = question.kind === 'money' ? isCurrency(unit) : baseUnit(unit) === baseUnit(question.unit);
  const at = fits ? millionths(value, unit) : null;
  return at === null ? null : { kind: 'compares', question: place, by, at, currency: question.kind === 'money' ? unit : null };
}

function boundOf(leaf: Leaf): readonly [Comparison, Threshold] | null {
  if ('lt' in leaf) return ['lt', leaf.lt];
  if ('le' in leaf) return ['le', leaf.le];
  if ('gt' in leaf) return ['gt', leaf.gt];
  return 'ge' in leaf ? ['ge', leaf.ge] : null;
}
