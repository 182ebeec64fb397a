import type { AnswerValue, Answers } from '@/lib/checks/domain/knowledge';
import type { EngineRule, Layer, LineInput } from '@/lib/checks/domain/line';
import type { Question } from '@/lib/checks/domain/questions';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import type { Condition } from '@/lib/regions/domain/condition';
import type { Random } from './random';

const OPTIONS = ['red', 'green', 'blue', 'white'];
const BOUNDS = [10, 25, 40];
const REGIONS = ['care', 'qq', 'qq-x'];

/** Twenty questions: eight answered yes or no, eight with four options, four amounts. */
export const QUESTIONS: readonly Question[] = Array.from({ length: 20 }, (_, at): Question => {
  const own = { id: `q${at}`, topic: 'use' } as const;
  if (at % 5 === 4) return { ...own, kind: 'amount', unit: 'mm' };
  return at % 5 < 2 ? { ...own, kind: 'yesno' } : { ...own, kind: 'choice', options: OPTIONS };
});
const [FIRST = { id: 'q0', topic: 'use', kind: 'yesno' } satisfies Question] = QUESTIONS;

function leaf(random: Random): Condition {
  const question = random.from(QUESTIONS, FIRST);
  const own = { question: question.id };
  if (question.kind === 'yesno') return { ...own, is: random.chance(0.5) };
  if (question.kind === 'choice') {
    const [one, other] = [random.from(OPTIONS, ''), random.from(OPTIONS, '')];
    return random.chance(0.5) ? { ...own, is: one } : { ...own, in: [one, other] };
  }
  const bound = { value: random.from(BOUNDS, 25), unit: 'mm' };
  return random.chance(0.5) ? { ...own, le: bound } : { ...own, gt: bound };
}

/** About four tests a rule, as sheets have them: all of these, one line perhaps any of these, perhaps an unless. */
function condition(random: Random): Condition {
  const any: Condition = { any: [leaf(random), leaf(random)] };
  const lines = [leaf(random), random.chance(0.7) ? any : leaf(random)];
  if (random.chance(0.5)) lines.push({ not: random.chance(0.4) ? { all: [leaf(random), leaf(random)] } : leaf(random) });
  if (random.chance(0.4)) lines.push(leaf(random));
  return { all: lines };
}

function rule(random: Random, at: number, region: string): EngineRule {
  const attacks = at > 0 && random.chance(0.2);
  return {
    id: `r${at}`,
    region,
    kind: attacks ? random.from(['replaces', 'excepts'] as const, 'excepts') : 'adds',
    targets: attacks ? [`r${random.below(at)}`] : [],
    alongside: [],
    when: condition(random),
    from: null,
    to: null,
    order: at,
    firm: false,
  };
}

/** A line of so many invented rules in three layers, a fifth of which attack a rule of lower rank. */
export function inventedLine(random: Random, count: number): LineInput {
  const layers = REGIONS.map((region, layer): Layer => {
    const [first, end] = [Math.floor((layer * count) / REGIONS.length), Math.floor(((layer + 1) * count) / REGIONS.length)];
    return { region, rules: Array.from({ length: end - first }, (_, at) => rule(random, first + at, region)), terms: [] };
  });
  return { questions: QUESTIONS, layers, except: [], on: calendarDateOf(new Date('2026-12-01')), places: [] };
}

function answer(random: Random, question: Question): AnswerValue {
  if (question.kind === 'yesno') return random.chance(0.5);
  return question.kind === 'choice' ? random.from(OPTIONS, '') : random.below(50);
}

/** A piece of which everything is known. */
export const inventedPiece = (random: Random): Answers =>
  Object.fromEntries(QUESTIONS.map((question) => [question.id, answer(random, question)]));

/** The same piece with each answer missing by an even chance. */
export const halfOf = (random: Random, answers: Answers): Answers =>
  Object.fromEntries(Object.entries(answers).filter(() => random.chance(0.5)));
