import type { Answers, AnswerValue } from '@/lib/checks/domain/knowledge';
import type { EngineRule, LineInput, Place } from '@/lib/checks/domain/line';
import type { Question } from '@/lib/checks/domain/questions';
import type { Condition, Threshold } from '@/lib/regions/domain/condition';

/*
 * Rules and answers in a form that any rule library can take: no gates, terms, layers, dates or units, only facts that are a
 * yes or no, a word or a whole number. Written from the sheets alone, by none of the engine's code, so that it can judge it.
 */

type PlainFact = boolean | string | number;
/** A fact that is not in it is not known. */
export type PlainFacts = Readonly<Record<string, PlainFact>>;
export type PlainComparison = 'lt' | 'le' | 'gt' | 'ge';
export type Plain =
  | boolean
  | { readonly all: readonly Plain[] }
  | { readonly any: readonly Plain[] }
  | { readonly not: Plain }
  | { readonly fact: string; readonly is: boolean | string }
  | { readonly fact: string; readonly in: readonly string[] }
  | { readonly fact: string; readonly by: PlainComparison; readonly at: number };

/** An active rule: when it applies, and the places in the list of the rules that attack it, all of them further down. */
export type PlainRule = { readonly id: string; readonly when: Plain; readonly attackers: readonly number[] };

/** Units of the invented rules, in millionths of their base unit. A currency counts in millionths of itself. */
const MILLIONTHS: Readonly<Record<string, number>> = { cm: 10_000_000, L: 1_000_000_000, g: 1_000 };
const whole = (value: number | string, unit: string): number => Math.round(Number(value) * (MILLIONTHS[unit] ?? 1_000_000));

const isOn = (span: { readonly from: string | null; readonly to: string | null }, day: string): boolean =>
  (span.from ?? '') <= day && (span.to === null || day < span.to);

type Leaf = Extract<Condition, { readonly question: string }>;

function boundOf(leaf: Leaf): readonly [PlainComparison, Threshold] | null {
  if ('lt' in leaf) return ['lt', leaf.lt];
  if ('le' in leaf) return ['le', leaf.le];
  if ('gt' in leaf) return ['gt', leaf.gt];
  return 'ge' in leaf ? ['ge', leaf.ge] : null;
}

class Reader {
  private readonly questions: ReadonlyMap<string, Question>;

  constructor(private readonly input: LineInput) {
    this.questions = new Map(input.questions.map((question) => [question.id, question]));
  }

  plain(condition: Condition, layer: number): Plain {
    if (typeof condition === 'boolean') return condition;
    if ('all' in condition) return { all: condition.all.map((part) => this.plain(part, layer)) };
    if ('any' in condition) return { any: condition.any.map((part) => this.plain(part, layer)) };
    if ('not' in condition) return { not: this.plain(condition.not, layer) };
    return 'term' in condition ? this.term(condition.term, layer) : this.gated(condition);
  }

  /** The term's own layer first, then from local to general. */
  private term(id: string, layer: number): Plain {
    const { layers, on } = this.input;
    for (const home of [layer, ...[...layers.keys()].reverse()]) {
      const term = layers[home]?.terms.find((one) => one.id === id && isOn(one, on));
      if (term !== undefined) return this.plain(term.when, home);
    }
    throw new Error(`There is no term ${id}`);
  }

  private gated(leaf: Leaf): Plain {
    const question = this.questions.get(leaf.question);
    if (question === undefined) throw new Error(`There is no question ${leaf.question}`);
    const own = leafOf(leaf, question);
    return question.askIf === undefined ? own : { all: [this.gated(question.askIf), own] };
  }
}

function leafOf(leaf: Leaf, question: Question): Plain {
  const { id } = question;
  if ('within' in leaf) return { fact: `${id} within ${leaf.within}`, is: true };
  const bound = boundOf(leaf);
  if (bound !== null) {
    const [by, { value, unit }] = bound;
    return { fact: question.kind === 'money' ? `${id} ${unit}` : id, by, at: whole(value, unit) };
  }
  if (question.kind === 'yesno') return { fact: id, is: 'is' in leaf && leaf.is === true };
  return pickedBy('in' in leaf ? leaf.in : 'is' in leaf ? [String(leaf.is)] : [], question);
}

/** A test that every answer passes is none. */
function pickedBy(wanted: readonly string[], { id, kind, ...question }: Question): Plain {
  if (kind === 'several') return { any: wanted.map((option) => ({ fact: `${id} ${option}`, is: true })) };
  const others = 'options' in question ? question.options.filter((option) => !wanted.includes(option)) : [];
  if (others.length === 0) return true;
  const [only = ''] = wanted;
  return wanted.length === 1 ? { fact: id, is: only } : { fact: id, in: wanted };
}

/** The active rules of a line, lowest rank first. */
export function plainRules(input: LineInput): readonly PlainRule[] {
  const reader = new Reader(input);
  const byRank = (a: EngineRule, b: EngineRule): number => a.order - b.order || (a.id < b.id ? -1 : 1);
  const active = input.layers.flatMap(({ rules }, layer) =>
    rules
      .filter((rule) => isOn(rule, input.on) && !input.except.includes(rule.id))
      .toSorted(byRank)
      .map((rule) => ({ rule, layer })),
  );
  return active.map(({ rule: { id, when }, layer }) => ({
    id,
    when: reader.plain(when, layer),
    attackers: active.flatMap(({ rule }, at) => (rule.targets.includes(id) ? at : [])),
  }));
}

/** The facts that an answer to every kind of question settles. Only whole answers in the currencies of the rules are understood. */
export function plainFacts(
  { questions, places }: Pick<LineInput, 'questions' | 'places'>,
  codes: readonly string[],
  answers: Answers,
): PlainFacts {
  return Object.fromEntries(
    questions.flatMap((question) => {
      const answer = answers[question.id];
      return answer === undefined ? [] : factsOf(question, answer, { codes, places });
    }),
  );
}

type Named = { readonly codes: readonly string[]; readonly places: readonly Place[] };

function factsOf(question: Question, answer: AnswerValue, { codes, places }: Named): readonly (readonly [string, PlainFact])[] {
  const { id } = question;
  if (question.kind === 'several')
    return question.options.map((option) => [`${id} ${option}`, isList(answer) && answer.some((one) => one === option)]);
  if (question.kind === 'region') {
    const line = lineOf(typeof answer === 'string' ? answer : '', codes, places);
    return codes.map((code) => [`${id} within ${code}`, line.includes(code)]);
  }
  if (isList(answer)) {
    return answer.flatMap((one): readonly (readonly [string, PlainFact])[] =>
      typeof one === 'string' ? [] : [[`${id} ${one.currency}`, whole(one.amount, one.currency)]],
    );
  }
  if (typeof answer === 'object') return [];
  return [[id, question.kind === 'amount' ? whole(String(answer), question.unit) : answer]];
}

const isList = (answer: AnswerValue): answer is Extract<AnswerValue, readonly unknown[]> => Array.isArray(answer);

/** A place that is neither listed nor named counts as the country it is a part of. */
function lineOf(code: string, codes: readonly string[], places: readonly Place[]): readonly string[] {
  const listed = places.find((place) => place.code === code);
  if (listed !== undefined) return listed.line;
  if (codes.includes(code)) return [code];
  const country = code.split('-')[0] ?? code;
  return country === code ? [] : lineOf(country, codes, places);
}

/** Every code that a condition of the rules names. */
export function codesIn(rules: readonly PlainRule[]): readonly string[] {
  const named = rules.flatMap(({ when }) => [...JSON.stringify(when).matchAll(/ within ([a-z-]+)"/g)].map(([, code]) => code ?? ''));
  return [...new Set(named)].sort();
}

/**
 * Which rules are effective, from whether each applies: it is not if an attacker is. Values go from 0, no, to 2, yes; 1 is open.
 * Libraries know no exceptions; these lines do it for all of them.
 */
export function effective(rules: readonly PlainRule[], applies: readonly number[]): readonly number[] {
  const values = applies.slice();
  for (let at = rules.length - 1; at >= 0; at -= 1) {
    for (const attacker of rules[at]?.attackers ?? []) values[at] = Math.min(values[at] ?? 0, 2 - (values[attacker] ?? 0));
  }
  return values;
}
