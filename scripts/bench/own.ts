import { setFlagsFromString } from 'node:v8';
import { runInNewContext } from 'node:vm';
import { cutSpace } from '@/lib/checks/domain/cells';
import type { Workshop } from '@/lib/checks/domain/compile-condition';
import { DiagramBuilder, NEVER } from '@/lib/checks/domain/diagram-builder';
import { exactOf, judge } from '@/lib/checks/domain/judge';
import { knowledgeOf, type Answers } from '@/lib/checks/domain/knowledge';
import type { CompiledLine, LineInput } from '@/lib/checks/domain/line';
import { buildLine, readLine } from '@/lib/checks/domain/line-build';
import { compareMeaning } from '@/lib/checks/domain/meaning';
import { nextQuestion } from '@/lib/checks/domain/next-question';
import { TapeWriter, type Tape } from '@/lib/checks/domain/tape';
import { runTrial } from '@/lib/checks/domain/trial-run';
import type { Condition } from '@/lib/regions/domain/condition';
import type { Trial } from '@/lib/regions/domain/trial';
import { compiled, type Ground } from './ground';
import { msOf, quantile, throughput, type Measure } from './measure';

/** The time of each step when pieces are asked for from the first question to the last. */
function asking(line: CompiledLine, pieces: readonly Answers[]): readonly number[] {
  return pieces.flatMap((piece) => {
    const steps: number[] = [];
    let answers: Answers = {};
    for (;;) {
      const start = performance.now();
      const next = nextQuestion(line, answers, []);
      steps.push(performance.now() - start);
      const answer = next === null ? undefined : piece[next];
      if (next === null || answer === undefined) return steps;
      answers = { ...answers, [next]: answer };
    }
  });
}

function latency(
  name: string,
  aim: string,
  { line, pieces, share }: { line: CompiledLine; pieces: readonly Answers[]; share: number },
): Measure {
  return { name, aim, unit: 'ms', run: () => quantile(asking(line, pieces), share) };
}

/** Draws no diagram. */
class NoDiagrams extends DiagramBuilder {
  override literal = (): number => NEVER;
  override all = (): number => NEVER;
  override any = (): number => NEVER;
  override not = (): number => NEVER;
}

function tapeAlone(input: LineInput): Tape {
  const read = readLine(input);
  const space = read.ok ? cutSpace(input.questions, read.value.tests, input.places) : read;
  if (!read.ok || !space.ok) throw new Error('The invented rules do not compile');
  const shop: Workshop = {
    space: space.value,
    builder: new NoDiagrams(space.value.variables),
    tape: new TapeWriter(),
    terms: [],
    gates: [],
  };
  buildLine(read.value, shop);
  return shop.tape.finish();
}

/** The same rules, of which every so manieth has one line more. */
function amended(input: LineInput, every: number): LineInput {
  const [question] = input.questions;
  const more: Condition = { question: question?.id ?? '', is: true };
  const layers = input.layers.map((layer) => ({
    ...layer,
    rules: layer.rules.map((rule) =>
      rule.order % every === 0
        ? { ...rule, when: { any: [rule.when, { all: [more, rule.when] }, { not: { any: [more, { not: rule.when }] } }, more] } }
        : rule,
    ),
  }));
  return { ...input, layers };
}

function comparison(name: string, aim: string, input: LineInput, every: number): Measure {
  const other = amended(input, every);
  const run = (): Promise<number> =>
    msOf(() => {
      const meanings = compareMeaning({ before: input, after: other });
      if (!meanings.ok || meanings.value.every(({ kind }) => kind === 'same')) throw new Error('The amended rules do not compare');
    });
  return { name, aim, unit: 'ms', run };
}

/** Five hundred pieces, each with what is expected of twenty rules; a quarter of its answers are missing. */
function trialsOf({ line, input, whole }: Ground): readonly Trial[] {
  return Array.from({ length: 500 }, (_, at): Trial => {
    const answers = Object.entries(whole.answers[at % whole.answers.length] ?? {}).filter((_entry, question) => (question + at) % 4 !== 0);
    const outcomes = judge(line, Object.fromEntries(answers), []).filter((_outcome, rank) => (rank + at) % 15 === 0);
    const expected = Object.fromEntries(outcomes.map(({ id, status }) => [id, status]));
    return { id: `t${at}`, title: '', on: input.on, answers: Object.fromEntries(answers), declined: [], expected };
  });
}

function trialRun(ground: Ground): Measure {
  const { line, input } = ground;
  const trials = trialsOf(ground);
  const failing = trials.flatMap((trial) => runTrial(line, trial, input.questions));
  if (failing.length > 0) throw new Error(`Trial pieces come out otherwise than they were judged: ${JSON.stringify(failing[0])}`);
  const run = (): Promise<number> =>
    msOf(() => {
      for (const trial of trials) runTrial(line, trial, input.questions);
    });
  return { name: '500 trial pieces, 20 rules expected of each', aim: 'at most 50', unit: 'ms', run };
}

/** Everything measured of the engine alone. */
export function ownMeasures(ground: Ground): readonly Measure[] {
  const { input, line, small, whole, half } = ground;
  const few = whole.answers.slice(0, 16);
  const exact = (piece: Answers): unknown => exactOf(line, knowledgeOf(line, piece));
  const full = (piece: Answers): unknown => judge(line, piece, []);
  const compile = (name: string, aim: string, work: () => unknown): Measure => ({ name, aim, unit: 'ms', run: () => msOf(work) });
  return [
    compile('compile 300 rules, tape alone', 'at most 5', () => tapeAlone(input)),
    compile('compile 300 rules, with diagrams', 'at most 80', () => compiled(input)),
    throughput('exact status, complete', 'at least 20000', { pieces: whole.answers, times: 30, work: exact }),
    throughput('exact status, half known', 'at least 15000', { pieces: half.answers, times: 30, work: exact }),
    throughput('outcomes with reasons, complete', '', { pieces: whole.answers, times: 3, work: full }),
    throughput('outcomes with reasons, half known', '', { pieces: half.answers, times: 3, work: full }),
    latency('next question, 40 rules, p50', '', { line: small, pieces: few, share: 0.5 }),
    latency('next question, 40 rules, p95', 'at most 1', { line: small, pieces: few, share: 0.95 }),
    latency('next question, 300 rules, p50', '', { line, pieces: few, share: 0.5 }),
    latency('next question, 300 rules, p95', 'at most 12', { line, pieces: few, share: 0.95 }),
    comparison('comparison of two sheets of 300 rules, a tenth changed', 'at most 120', input, 10),
    comparison('comparison of two sheets of 300 rules, all changed', '', input, 1),
    trialRun(ground),
  ];
}

/** Kilobytes that one compiled line of 300 rules holds, the conditions it came from not counted. */
export function memoryOf(input: LineInput): number {
  setFlagsFromString('--expose-gc');
  const collect = runInNewContext('gc') as () => void;
  const used = (): number => {
    collect();
    collect();
    const { heapUsed, arrayBuffers } = process.memoryUsage();
    return heapUsed + arrayBuffers;
  };
  const lines: CompiledLine[] = [compiled(input)];
  const before = used();
  for (let copy = 0; copy < 20; copy += 1) lines.push(compiled(input));
  const held = used() - before;
  return held / (lines.length - 1) / 1000;
}
