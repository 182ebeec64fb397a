import { err, ok, type Result } from '@/lib/kernel/result';
import { YES, type Tri } from '@/lib/kernel/tri';
import { cutSpace } from './cells';
import { shareOf, type Share } from './combinations';
import type { Workshop } from './compile-condition';
import { DiagramBuilder, NEVER } from './diagram-builder';
import { ExactStatus } from './exact-status';
import { ExamplePaths } from './example-path';
import type { Status } from './judge';
import { knowledgeOf, type Answers } from './knowledge';
import { buildLine, readLine, type BuiltRule } from './line-build';
import type { CompileFault, LineInput } from './line-input';
import { rulesToBuild, withOnly, type ReadVersions } from './rule-signatures';
import { TapeWriter } from './tape';

/** A piece that a rule judges otherwise than before. Null: the rule is not in that version of the line. */
export type MeaningExample = { readonly answers: Answers; readonly before: Status | null; readonly after: Status | null };

/** What a change does to one rule. Two wordings of one meaning are the same, however they are written. */
export type RuleMeaning = {
  readonly rule: string;
  readonly kind: 'added' | 'withdrawn' | 'same' | 'changed';
  /** Null where nothing differs, or no real answers tell the difference. */
  readonly example: MeaningExample | null;
  /**
   * The combinations of answers in which the rule stands otherwise, of all combinations of the questions it turns on, each
   * counted once. Amounts count by the cells that both versions cut together. No share of pots.
   */
  readonly share: Share;
};

type Versions = { readonly before: LineInput; readonly after: LineInput };

/**
 * Compares two versions of a line rule by rule, in one store of diagrams, so that one node is one meaning. Tells of every rule
 * that is active in either: those of the later version in rank order, then those that are gone. A rule that nobody edited is
 * told as changed when an attack, an exception or a term changes what it means. Fails when a version does not compile, or when
 * both together need more cells or nodes than allowed.
 */
export function compareMeaning(versions: Versions): Result<readonly RuleMeaning[], CompileFault> {
  const { before, after } = versions;
  const earlier = readLine(before);
  if (!earlier.ok) return earlier;
  const later = readLine(after);
  if (!later.ok) return later;
  const read = { earlier: earlier.value, later: later.value };
  const { differing, needed } = rulesToBuild(read, [before.places, after.places]);
  const ids = [...new Set([read.later, read.earlier].flatMap(({ rules }) => rules.map(({ rule }) => rule.id)))];
  const different = differing.size === 0 ? ok(NONE) : tellDifferent(versions, read, needed);
  if (!different.ok) return different;
  return ok(ids.map((rule) => (differing.has(rule) ? different.value.get(rule) : undefined) ?? same(rule)));
}

const NONE: ReadonlyMap<string, RuleMeaning> = new Map();
const same = (rule: string): RuleMeaning => ({ rule, kind: 'same', example: null, share: { cases: '0', of: '1', percent: '0' } });

/** Builds and compares what is written otherwise. Amounts are cut as finely as the whole of both lines asks for. */
function tellDifferent(
  { before, after }: Versions,
  read: ReadVersions,
  needed: ReadonlySet<string>,
): Result<ReadonlyMap<string, RuleMeaning>, CompileFault> {
  const places = [...before.places, ...after.places];
  const space = cutSpace(after.questions, [...read.earlier.tests, ...read.later.tests], places);
  if (!space.ok) return space;
  const ground: Ground = { space: space.value, builder: new DiagramBuilder(space.value.variables), questions: after.questions };
  const built = buildPairs({ earlier: withOnly(read.earlier, needed), later: withOnly(read.later, needed) }, ground);
  return built.ok ? ok(new Map(tell(built.value, ground).map((meaning) => [meaning.rule, meaning]))) : built;
}

type Ground = Pick<Workshop, 'space' | 'builder'> & Pick<LineInput, 'questions'>;

function buildPairs({ earlier, later }: ReadVersions, { space, builder }: Ground): Result<readonly Difference[], CompileFault> {
  const shop = (): Workshop => ({ space, builder, tape: new TapeWriter(), terms: [], gates: [] });
  const was = buildLine(earlier, shop());
  if (!was.ok) return was;
  const is = buildLine(later, shop());
  if (!is.ok) return is;
  const differences: Difference[] = [];
  for (const pair of pairsOf(was.value, is.value)) {
    differences.push(differenceIn(pair, builder));
    if (builder.store.overfull) return err({ kind: 'too-many-nodes', in: pair.rule });
  }
  return ok(differences);
}

/** One version of a rule: where it applies, and where one that disagrees with it applies too. */
type Version = { readonly node: number; readonly rivals: readonly number[] };
type Pair = { readonly rule: string; readonly before: Version | null; readonly after: Version | null };

function pairsOf(was: readonly BuiltRule[], is: readonly BuiltRule[]): readonly Pair[] {
  const versionsOf = (rules: readonly BuiltRule[]): ReadonlyMap<string, Version> =>
    new Map(rules.map(({ id, node, disagrees }) => [id, { node, rivals: disagrees.map((rank) => rules[rank]?.node ?? NEVER) }]));
  const earlier = versionsOf(was);
  const later = versionsOf(is);
  const ids = new Set([...later.keys(), ...earlier.keys()]);
  return [...ids].map((rule) => ({ rule, before: earlier.get(rule) ?? null, after: later.get(rule) ?? null }));
}

/** `differs` holds where the two versions judge otherwise; each of `telling` holds only where they surely do. */
type Difference = Pair & { readonly differs: number; readonly telling: readonly number[] };

const ABSENT: Version = { node: NEVER, rivals: [] };

function differenceIn(pair: Pair, builder: DiagramBuilder): Difference {
  const was = pair.before ?? ABSENT;
  const is = pair.after ?? ABSENT;
  const without = (node: number, other: number): number => builder.all([node, builder.not(other)]);
  const disputed = ({ node, rivals }: Version): number => builder.all([node, builder.any(rivals)]);
  const [disputedBefore, disputedAfter] = [disputed(was), disputed(is)];
  const newly = without(is.node, was.node);
  const noLonger = without(was.node, is.node);
  const differs = [newly, noLonger, without(disputedAfter, disputedBefore), without(disputedBefore, disputedAfter)];
  const both = builder.all([was.node, is.node]);
  const telling = [
    newly,
    noLonger,
    ...is.rivals.map((rival) => builder.all([both, rival, builder.not(disputedBefore)])),
    ...was.rivals.map((rival) => builder.all([both, rival, builder.not(disputedAfter)])),
  ];
  return { ...pair, differs: builder.any(differs), telling };
}

function tell(differences: readonly Difference[], { builder, space, questions }: Ground): readonly RuleMeaning[] {
  const paths = new ExamplePaths(builder.store, space, questions);
  const statuses = new ExactStatus(builder.store);
  const line = { questions: questions.map(({ id }) => id), cells: space.byQuestion, variables: space.variables };
  const exampleOf = ({ before, after, telling }: Difference): MeaningExample | null => {
    const answers = telling.reduce<Answers | null>((found, node) => found ?? paths.answersTo(node), null);
    if (answers === null) return null;
    const { masks } = knowledgeOf(line, answers);
    statuses.forget();
    const exact = (node: number): Tri => statuses.of(node, masks);
    return { answers, before: statusOf(before, exact), after: statusOf(after, exact) };
  };
  return differences.map((difference): RuleMeaning => {
    const { rule, before, after, differs } = difference;
    const nodes = [before?.node ?? NEVER, after?.node ?? NEVER];
    const kind = kindOf(difference);
    const example = kind === 'same' ? null : exampleOf(difference);
    return { rule, kind, example, share: shareOf(builder.store, space.variables, { node: differs, nodes }) };
  });
}

function kindOf({ before, after, differs }: Difference): RuleMeaning['kind'] {
  if (before === null) return 'added';
  if (after === null) return 'withdrawn';
  return differs === NEVER ? 'same' : 'changed';
}

/** An example settles every rule it tells of. */
function statusOf(version: Version | null, exact: (node: number) => Tri): Status | null {
  if (version === null) return null;
  if (exact(version.node) !== YES) return 'does-not-apply';
  return version.rivals.some((rival) => exact(rival) === YES) ? 'sources-disagree' : 'applies';
}
