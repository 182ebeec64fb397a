import type { Answers } from '@/lib/checks/domain/knowledge';
import { compileLine, type CompiledLine, type LineInput } from '@/lib/checks/domain/line';
import { halfOf, inventedLine, inventedPiece } from './invented-rules';
import { plainFacts, plainRules, type PlainFacts, type PlainRule } from './plain-rules';
import { Random } from './random';

export const SEED = 7;
export const PIECES = 64;
export const LARGE = 300;
export const SMALL = 40;

/** Pieces as answers for the engine, and as facts for everybody else. */
export type Pieces = { readonly answers: readonly Answers[]; readonly facts: readonly PlainFacts[] };

/** What everything is measured on: invented rules and pieces, the same at every run. */
export type Ground = {
  readonly input: LineInput;
  readonly line: CompiledLine;
  readonly small: CompiledLine;
  readonly rules: readonly PlainRule[];
  readonly whole: Pieces;
  readonly half: Pieces;
};

export function compiled(input: LineInput): CompiledLine {
  const line = compileLine(input);
  if (!line.ok) throw new Error(`The invented rules do not compile: ${JSON.stringify(line.error)}`);
  return line.value;
}

export function ground(): Ground {
  const random = new Random(SEED);
  const input = inventedLine(random, LARGE);
  const small = compiled(inventedLine(random, SMALL));
  const whole = Array.from({ length: PIECES }, () => inventedPiece(random));
  const half = whole.map((piece) => halfOf(random, piece));
  const pieces = (answers: readonly Answers[]): Pieces => ({ answers, facts: answers.map((piece) => plainFacts(input, [], piece)) });
  return { input, line: compiled(input), small, rules: plainRules(input), whole: pieces(whole), half: pieces(half) };
}
