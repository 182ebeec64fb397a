import type { Condition } from '@/lib/regions/domain/condition';
import type { Sheet } from '@/lib/regions/domain/sheet';
import type { Part } from './compile-condition';
import type { CompiledDay } from './compiled-days';
import { questionsOf } from './diagram';
import { NEVER } from './diagram-builder';
import { fault, inRule, inTerm, remark, type Finding } from './finding';
import type { CompiledLine, CompiledRule } from './line';
import { worldAfter, worldBefore, type Proposal, type World } from './proposal-lines';

/**
 * C5: a question behind a gate that cannot open, a part of a condition that can never hold, a question that is written down and
 * changes nothing, and questions and terms that nothing uses any more.
 */
export function checkQuestions(proposal: Proposal, days: readonly CompiledDay[]): readonly Finding[] {
  const own = new Set(proposal.proposed.rules.map(({ id }) => id));
  return [
    ...days.flatMap(({ line }) =>
      line.rules.flatMap((rule, rank) => {
        const part = line.wording.rules[rank];
        return own.has(rule.id) && part !== undefined ? findingsInRule(line, rule, part) : [];
      }),
    ),
    ...unusedQuestions(proposal),
    ...unusedTerms(proposal),
  ];
}

function findingsInRule(line: CompiledLine, { id }: CompiledRule, whole: Part): readonly Finding[] {
  const at = inRule(id, 'when');
  const asked = new Set(testsIn(whole));
  const shut = [...asked].filter((question) => isShut(line, question));
  if (shut.length > 0)
    return shut.map((place) => fault('C5', { at, kind: 'gate-never', values: { question: line.questions[place] ?? '' } }));
  // Of a rule that never or always applies check C4 tells.
  if (whole.node === NEVER || whole.node === 1) return [];
  const matters = new Set(questionsOf(line.wording.diagram, whole.node));
  const idle = [...asked].filter((question) => !matters.has(question));
  return [
    ...idle.map((place) => remark('C5', { at, kind: 'question-idle', values: { question: line.questions[place] ?? '' } })),
    ...(innerParts(whole).some(({ node, kind }) => node === NEVER && kind !== 'always') ? [remark('C5', { at, kind: 'part-never' })] : []),
  ];
}

/** Behind a gate that no answers open; gates behind gates count through it. */
function isShut({ wording }: CompiledLine, question: number): boolean {
  return wording.gates.get(question)?.node === NEVER;
}

const innerParts = (part: Part): readonly Part[] => ('parts' in part ? part.parts.flatMap((inner) => [inner, ...innerParts(inner)]) : []);

/** Questions a condition asks itself, not by way of a term. */
function testsIn(part: Part): readonly number[] {
  if (part.kind === 'test') return [part.question];
  return 'parts' in part ? part.parts.flatMap(testsIn) : [];
}

/** Questions that some sheet asks now and that none would ask any more. Questions themselves change by code review. */
function unusedQuestions(proposal: Proposal): readonly Finding[] {
  const gone = setMinus(questionsIn(worldBefore(proposal)), questionsIn(worldAfter(proposal)));
  const at = { list: 'sheet', id: proposal.proposed.code, field: 'rules' } as const;
  return [...gone].map((question) => remark('C5', { at, kind: 'question-unused', values: { question } }));
}

const setMinus = (one: ReadonlySet<string>, other: ReadonlySet<string>): ReadonlySet<string> =>
  new Set([...one].filter((id) => !other.has(id)));

const conditionsOf = ({ rules, terms }: Sheet): readonly Condition[] => [...rules, ...terms].map(({ when }) => when);

const questionsIn = ({ sheets }: World): ReadonlySet<string> =>
  new Set([...sheets.values()].flatMap(conditionsOf).flatMap((when) => namesIn(when, 'question')));

function namesIn(when: Condition, member: 'question' | 'term'): readonly string[] {
  if (typeof when === 'boolean') return [];
  if ('all' in when) return when.all.flatMap((part) => namesIn(part, member));
  if ('any' in when) return when.any.flatMap((part) => namesIn(part, member));
  if ('not' in when) return namesIn(when.not, member);
  if ('term' in when) return member === 'term' ? [when.term] : [];
  return member === 'question' ? [when.question] : [];
}

/** Terms of the sheet that neither it nor any other sheet uses; a category is shown by itself. */
function unusedTerms(proposal: Proposal): readonly Finding[] {
  const used = new Set([...worldAfter(proposal).sheets.values()].flatMap(conditionsOf).flatMap((when) => namesIn(when, 'term')));
  const idle = proposal.proposed.terms.filter(({ id, category }) => !category && !used.has(id));
  return idle.map(({ id }) => remark('C5', { at: inTerm(id, 'id'), kind: 'term-unused', values: { term: id } }));
}
