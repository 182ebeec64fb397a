import { exactOf, kleeneOf } from '@/lib/checks/domain/judge';
import { knowledgeOf } from '@/lib/checks/domain/knowledge';
import type { Ground, Pieces } from './ground';
import { compiledLogic, interpretedLogic } from './json-logic';
import { rulesEngine } from './json-rules';
import { figure, quantile, rowOf, throughput, inRounds, type Measure } from './measure';
import { effective, type PlainFacts } from './plain-rules';
import { publicodesRules } from './publicodes-rules';

type Verdicts = readonly number[];

/** A rule library with all the rules in it. `times`: how often it judges so many pieces in one round. */
type Peer = {
  readonly name: string;
  readonly aim: number;
  readonly times: number;
  readonly pieces: number;
  readonly leavesOpen: boolean;
  readonly judge: (facts: PlainFacts) => Verdicts | Promise<Verdicts>;
};

/** Exceptions are worked out for each library in the same few lines: none of them knows any. */
export function peersOf({ rules }: Ground): readonly Peer[] {
  const [built, interpreted, events, french] = [compiledLogic(rules), interpretedLogic(rules), rulesEngine(rules), publicodesRules(rules)];
  const whole = { pieces: Infinity, leavesOpen: false } as const;
  return [
    { ...whole, name: 'json-logic-engine, compiled', aim: 2, times: 12, judge: (facts) => effective(rules, built(facts)) },
    { ...whole, name: 'json-logic-engine, interpreted', aim: 0, times: 3, judge: (facts) => effective(rules, interpreted(facts)) },
    { ...whole, name: 'json-rules-engine', aim: 200, times: 1, pieces: 6, judge: async (facts) => effective(rules, await events(facts)) },
    { name: 'publicodes', aim: 1000, times: 1, pieces: 2, leavesOpen: true, judge: (facts) => effective(rules, french(facts)) },
  ];
}

const isSame = (one: Verdicts, other: Verdicts): boolean => one.length === other.length && one.every((value, at) => value === other[at]);

/** Stops the benchmark unless tape, diagrams and every library agree on every rule and complete piece. Says how much was compared. */
export async function assertAgreement(all: Ground, peers: readonly Peer[]): Promise<string> {
  const { line, rules, whole, half } = all;
  for (const [at, answers] of whole.answers.entries()) {
    const knowledge = knowledgeOf(line, answers);
    if (!isSame(kleeneOf(line, knowledge), exactOf(line, knowledge))) throw new Error(`Tape and diagrams differ on piece ${at}`);
  }
  await assertSame(all, peers, whole);
  await assertSame(
    all,
    peers.filter(({ leavesOpen }) => leavesOpen),
    half,
  );
  return `Equal verdicts first: ${whole.answers.length} pieces × ${rules.length} rules, complete for all; half known for publicodes.`;
}

async function assertSame({ line }: Ground, peers: readonly Peer[], { answers, facts }: Pieces): Promise<void> {
  for (const [at, piece] of answers.entries()) {
    const own = kleeneOf(line, knowledgeOf(line, piece));
    for (const { name, judge } of peers) {
      if (!isSame(own, await judge(facts[at] ?? {}))) throw new Error(`${name} and the tape differ on piece ${at}`);
    }
  }
}

/** Side by side, round after round: how many times as fast the tape is, in the same round, by the median of all rounds. */
export async function ratios({ line, whole, half }: Ground, peers: readonly Peer[], rounds: number): Promise<readonly string[]> {
  const judgeOwn = (answers: Parameters<typeof knowledgeOf>[1]): unknown => kleeneOf(line, knowledgeOf(line, answers));
  const own = throughput('Footring, from answers to Kleene values, complete', 'at least 20000', {
    pieces: whole.answers,
    times: 30,
    work: judgeOwn,
  });
  const ownHalf = throughput('the same, half known', 'at least 15000', { pieces: half.answers, times: 30, work: judgeOwn });
  const others = peers.map(({ name, times, pieces, judge }) =>
    throughput(name, '', { pieces: whole.facts.slice(0, pieces), times, work: judge }),
  );
  const measures: readonly Measure[] = [own, ownHalf, ...others];
  const [ownRounds = [], halfRounds = [], ...otherRounds] = await inRounds(measures, rounds);
  const ratioRows = peers.map(({ name, aim }, at) => {
    const each = ownRounds.map((value, round) => value / (otherRounds[at]?.[round] ?? Number.NaN));
    const [least, middle, most] = [0, 0.5, 1].map((share) => figure(quantile(each, share)));
    return `| times as fast as ${name} | × | ${middle ?? ''} | ${least ?? ''} to ${most ?? ''} | ${aim === 0 ? '' : `at least ${aim}`} |`;
  });
  return [
    rowOf(own, ownRounds),
    rowOf(ownHalf, halfRounds),
    ...others.map((other, at) => rowOf(other, otherRounds[at] ?? [])),
    ...ratioRows,
  ];
}

type Overturned = { definite: number; missed: number; invented: number };

/** With half the answers missing, the definite verdicts that the whole answers overturn. */
export async function overturned({ line, whole, half }: Ground, peers: readonly Peer[]): Promise<readonly string[]> {
  const own = { name: 'Footring', judge: (_: PlainFacts, at: number) => kleeneOf(line, knowledgeOf(line, half.answers[at] ?? {})) };
  const exact = {
    name: 'Footring, exact status',
    judge: (_: PlainFacts, at: number) => exactOf(line, knowledgeOf(line, half.answers[at] ?? {})),
  };
  const rows = [];
  for (const { name, judge } of [own, exact, ...peers]) {
    const count: Overturned = { definite: 0, missed: 0, invented: 0 };
    for (const [at, facts] of half.facts.entries()) {
      tally(count, await judge(facts, at), exactOf(line, knowledgeOf(line, whole.answers[at] ?? {})));
    }
    const verdicts = half.facts.length * line.rules.length;
    const share = (number: number): string => `${((100 * number) / verdicts).toFixed(1)} %`;
    rows.push(
      `| ${name} | ${share(count.definite)} | ${share(count.missed + count.invented)} | ${share(count.missed)} | ${share(count.invented)} |`,
    );
  }
  return rows;
}

function tally(count: Overturned, said: Verdicts, truth: Verdicts): void {
  for (const [rank, value] of said.entries()) {
    if (value === 1) continue;
    count.definite += 1;
    if (value === truth[rank]) continue;
    if (value === 0) count.missed += 1;
    else count.invented += 1;
  }
}
