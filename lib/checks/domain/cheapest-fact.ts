import { UNKNOWN, YES } from '@/lib/kernel/tri';
import { ExactStatus } from './exact-status';
import { knowledgeOf, type Answers } from './knowledge';
import type { CompiledLine } from './line';
import { MEANS, meansOf, type Means } from './means';
import { Restriction } from './restriction';
import { trialsOf, type Trial } from './trial-answers';

/** A question still open, and what one answer to it would settle. */
export type Fact = {
  readonly question: string;
  readonly means: Means;
  /** Duties that any answer settles, by id. */
  readonly settles: readonly string[];
  /** How many the luckiest answer settles. Where there are more answers than can be tried, of those tried. */
  readonly atBest: number;
};

/** A line with the ids of the rules in it that are duties. */
export type DutyLine = { readonly compiled: CompiledLine; readonly duties: readonly string[] };

/** An open duty of one line. */
type Open = { readonly id: string; readonly node: number; readonly questions: readonly number[] };
type OpenLine = { readonly line: CompiledLine; readonly masks: Int32Array; readonly open: readonly Open[] };

/**
 * The open questions by how many open duties a single answer settles whatever it is, then by what it takes to find out, then in
 * the order of asking. A duty of several places counts once, and as settled only if it is in every one. Questions whose gate is
 * not known to be open are left out: their answer would first need another.
 */
export function cheapestFacts(lines: readonly DutyLine[], answers: Answers): readonly Fact[] {
  const open = lines.map((line) => openLine(line, answers));
  const places = new Set(open.flatMap((line) => line.open.flatMap(({ questions }) => questions)));
  return [...places]
    .sort((a, b) => a - b)
    .filter((place) => open.every((line) => isAskable(line, place)))
    .map((place) => factOf(open, place))
    .sort((a, b) => b.settles.length - a.settles.length || MEANS.indexOf(a.means) - MEANS.indexOf(b.means));
}

function openLine({ compiled, duties }: DutyLine, answers: Answers): OpenLine {
  const { masks } = knowledgeOf(compiled, answers);
  const restriction = new Restriction(compiled.diagram, compiled.variables, masks);
  const wanted = new Set(duties);
  const open = compiled.rules
    .filter(({ id }) => wanted.has(id))
    .map(({ id, node }) => ({ id, node, questions: restriction.questionsOpen(node) }))
    .filter(({ questions }) => questions.length > 0);
  return { line: compiled, masks, open };
}

function isAskable({ line, masks }: OpenLine, place: number): boolean {
  const gate = line.gates.get(place);
  return gate === undefined || new ExactStatus(line.diagram).of(gate, masks) === YES;
}

function factOf(lines: readonly OpenLine[], place: number): Fact {
  const question = lines[0]?.line.questions[place] ?? '';
  // What rests on this question alone is settled by any answer; what rests on another too is open for some answer.
  const settles = settledIn(lines, (_, { questions }) => questions.length === 1 && questions[0] === place);
  const looksAt = new Set(lines.flatMap((line) => variablesOf(line, place)));
  const cuts = lines.flatMap(({ line }) => line.cells[place] ?? []);
  const counts = trialsOf(cuts, looksAt).map((trial) => settledBy(lines, place, trial).length);
  return { question, means: meansOf(question), settles, atBest: Math.max(settles.length, ...counts) };
}

/** The ids of duties open somewhere and settled in every line they are open in. */
function settledIn(lines: readonly OpenLine[], isSettled: (line: OpenLine, duty: Open) => boolean): readonly string[] {
  const settled = new Map<string, boolean>();
  for (const line of lines) {
    for (const duty of line.open) settled.set(duty.id, (settled.get(duty.id) ?? true) && isSettled(line, duty));
  }
  return [...settled].flatMap(([id, is]) => (is ? id : []));
}

function settledBy(lines: readonly OpenLine[], place: number, trial: Trial): readonly string[] {
  const tried = new Map(lines.map((line) => [line, triedOn(line, place, trial)]));
  return settledIn(lines, (line, { node }) => {
    const known = tried.get(line);
    return known !== undefined && known.exact.of(node, known.masks) !== UNKNOWN;
  });
}

/** What would be known with that answer: it narrows what is known and takes nothing of it back. */
function triedOn({ line, masks }: OpenLine, place: number, trial: Trial): { readonly exact: ExactStatus; readonly masks: Int32Array } {
  const then = masks.slice();
  const cut = line.cells[place];
  if (cut !== null && cut !== undefined) {
    for (const [offset, mask] of trial(cut).entries()) {
      const narrowed = then[cut.first + offset]! & mask;
      if (narrowed !== 0) then[cut.first + offset] = narrowed;
    }
  }
  return { exact: new ExactStatus(line.diagram), masks: then };
}

/** The variables of a question, counted from its first, that the open duties still look at. */
function variablesOf({ line, open, masks }: OpenLine, place: number): readonly number[] {
  const cut = line.cells[place];
  if (cut === null || cut === undefined) return [];
  const seen = new Set<number>();
  const looked = new Set<number>();
  const visit = (node: number): void => {
    if (node < 2 || seen.has(node)) return;
    seen.add(node);
    const variable = line.diagram.variable[node]!;
    if (line.variables.question[variable] === place) looked.add(variable - cut.first);
    for (let cell = 0; cell < line.variables.cells[variable]!; cell += 1) {
      if ((masks[variable]! >> cell) & 1) visit(line.diagram.child[line.diagram.first[node]! + cell]!);
    }
  };
  for (const { node } of open) visit(node);
  return [...looked];
}
