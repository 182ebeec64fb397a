import os from 'node:os';
import { exactOf, judge, kleeneOf } from '@/lib/checks/domain/judge';
import { knowledgeOf, type Answers } from '@/lib/checks/domain/knowledge';
import { compileLine, type CompiledLine, type LineInput } from '@/lib/checks/domain/line';
import { nextQuestion } from '@/lib/checks/domain/next-question';
import { halfOf, inventedLine, inventedPiece, QUESTIONS } from './invented-rules';
import { Random } from './random';

const SEED = 7;
const ROUNDS = 9;
const PIECES = 64;
const [LARGE, SMALL] = [300, 40];

/** One thing to measure: how much of it a round does, and in what its figure is given. */
type Measure = {
  readonly name: string;
  readonly target: string;
  readonly unit: 'pieces/s' | 'ms';
  /** Does the work of one round and answers with its figure. */
  readonly run: () => number;
};

const msOf = (work: () => void): number => {
  const start = performance.now();
  work();
  return performance.now() - start;
};

const quantile = (values: readonly number[], share: number): number =>
  values.toSorted((a, b) => a - b)[Math.min(values.length - 1, Math.floor(values.length * share))] ?? 0;

function compiled(input: LineInput): CompiledLine {
  const line = compileLine(input);
  if (!line.ok) throw new Error(`The invented rules do not compile: ${JSON.stringify(line.error)}`);
  return line.value;
}

/** Pieces a second: every piece once, in turn, as often as makes a round of a length worth measuring. */
function throughput(
  name: string,
  target: string,
  { pieces, times, work }: { pieces: readonly Answers[]; times: number; work: (piece: Answers) => void },
): Measure {
  const run = (): number => {
    const ms = msOf(() => {
      for (let time = 0; time < times; time += 1) for (const piece of pieces) work(piece);
    });
    return (1000 * times * pieces.length) / ms;
  };
  return { name, target, unit: 'pieces/s', run };
}

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
  target: string,
  { line, pieces, share }: { line: CompiledLine; pieces: readonly Answers[]; share: number },
): Measure {
  return { name, target, unit: 'ms', run: () => quantile(asking(line, pieces), share) };
}

/** Where everything is known, the tape and the diagrams must say the same and leave nothing open. */
function assertAgreement(line: CompiledLine, pieces: readonly Answers[]): void {
  for (const piece of pieces) {
    const knowledge = knowledgeOf(line, piece);
    const [kleene, exact] = [kleeneOf(line, knowledge), exactOf(line, knowledge)];
    const left = judge(line, piece, []).findIndex((outcome, rank) => outcome.exact === 1 || kleene[rank] !== exact[rank]);
    if (left !== -1) throw new Error(`Tape and diagrams differ on ${line.rules[left]?.id ?? ''}`);
  }
}

function measures(): readonly Measure[] {
  const random = new Random(SEED);
  const input = inventedLine(random, LARGE);
  const line = compiled(input);
  const small = compiled(inventedLine(random, SMALL));
  const whole = Array.from({ length: PIECES }, () => inventedPiece(random));
  const half = whole.map((piece) => halfOf(random, piece));
  const few = whole.slice(0, 16);
  assertAgreement(line, whole);
  const exact = (piece: Answers): void => {
    exactOf(line, knowledgeOf(line, piece));
  };
  const kleene = (piece: Answers): void => {
    kleeneOf(line, knowledgeOf(line, piece));
  };
  const full = (piece: Answers): void => {
    judge(line, piece, []);
  };
  return [
    {
      name: 'compile 300 rules',
      target: 'at most 80',
      unit: 'ms',
      run: () =>
        msOf(() => {
          compiled(input);
        }),
    },
    throughput('exact status, complete', 'at least 20000', { pieces: whole, times: 30, work: exact }),
    throughput('exact status, half known', 'at least 15000', { pieces: half, times: 30, work: exact }),
    throughput('Kleene value, complete', '', { pieces: whole, times: 30, work: kleene }),
    throughput('Kleene value, half known', '', { pieces: half, times: 30, work: kleene }),
    throughput('outcomes with reasons, complete', '', { pieces: whole, times: 3, work: full }),
    throughput('outcomes with reasons, half known', '', { pieces: half, times: 3, work: full }),
    latency('next question, 40 rules, p50', '', { line: small, pieces: few, share: 0.5 }),
    latency('next question, 40 rules, p95', 'at most 1', { line: small, pieces: few, share: 0.95 }),
    latency('next question, 300 rules, p50', '', { line, pieces: few, share: 0.5 }),
    latency('next question, 300 rules, p95', 'at most 12', { line, pieces: few, share: 0.95 }),
  ];
}

const figure = (value: number): string => (value >= 100 ? Math.round(value).toString() : value.toPrecision(3));

/** Measures everything in turn, round after round, and answers with a Markdown table. The first round only warms up. */
export function benchEngine(): string {
  const all = measures();
  const rounds = Array.from({ length: ROUNDS + 1 }, () => all.map(({ run }) => run())).slice(1);
  const rows = all.map(({ name, unit, target }, at) => {
    const values = rounds.map((round) => round[at] ?? 0);
    const [least, middle, most] = [0, 0.5, 1].map((share) => figure(quantile(values, share)));
    return `| ${name} | ${unit} | ${middle ?? ''} | ${least ?? ''} to ${most ?? ''} | ${target} |`;
  });
  const about = [
    `${LARGE} rules × ${QUESTIONS.length} questions, ${PIECES} pieces in turn; medians of ${ROUNDS} interleaved rounds.`,
    `Node ${process.version}, V8 ${process.versions.v8}, ${os.cpus()[0]?.model ?? 'unknown processor'}; seed ${SEED}.`,
  ];
  return [...about, '', '| what | unit | median | spread | target |', '|---|---|---:|---:|---|', ...rows].join('\n');
}
