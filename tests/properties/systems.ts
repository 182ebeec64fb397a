import fc from 'fast-check';
import type { AnswerValue, Answers } from '@/lib/checks/domain/knowledge';
import type { EngineRule, EngineTerm, Layer, LineInput, Place } from '@/lib/checks/domain/line';
import type { Question } from '@/lib/checks/domain/questions';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { Unit } from '@/lib/kernel/quantity';
import type { Condition, Threshold } from '@/lib/regions/domain/condition';

/** Every property runs this often, always with the same cases. */
export const RUNS = { numRuns: 1000, seed: 20_261_201 };

/** Deals out numbers in turn, zeros once they run out: fast-check shrinks the list, and with it all that is built from it. */
export class Draws {
  private next = 0;
  constructor(private readonly numbers: readonly number[]) {}

  below(count: number): number {
    const number = this.numbers[this.next] ?? 0;
    this.next += 1;
    return number % count;
  }

  chance(percent: number): boolean {
    return this.below(100) < percent;
  }

  from<T>(list: readonly [T, ...T[]]): T;
  from<T>(list: readonly T[]): T | undefined;
  from<T>(list: readonly T[]): T | undefined {
    return list[this.below(list.length)];
  }

  some<T>(list: readonly T[], percent: number): readonly T[] {
    return list.filter(() => this.chance(percent));
  }

  shuffled<T>(list: readonly T[]): readonly T[] {
    return list
      .map((item) => ({ item, by: this.below(1000) }))
      .sort((a, b) => a.by - b.by)
      .map(({ item }) => item);
  }
}

/** An invented line of rules and one piece to judge by them. */
export type Case = {
  readonly input: LineInput;
  /** A complete and truthful answer to every question. */
  readonly whole: Answers;
  /** About half of it. */
  readonly answers: Answers;
  /** The half, with some answers of the wrong kind, in other currencies, or no nearer than a bloc. */
  readonly strange: Answers;
  readonly declined: readonly string[];
  readonly draws: readonly number[];
};

const numbers = (length: number): fc.Arbitrary<number[]> => fc.noBias(fc.array(fc.nat(999_999), { minLength: length, maxLength: length }));

export const cases: fc.Arbitrary<Case> = fc.tuple(numbers(420), numbers(120)).map(([dealt, draws]) => caseFrom(new Draws(dealt), draws));

/** A date known to be one. */
export const day = (text: string): CalendarDate => {
  const isDate = (date: string): date is CalendarDate => /^\d{4}-\d{2}-\d{2}$/.test(date);
  if (!isDate(text)) throw new Error(`Not a date: ${text}`);
  return text;
};
/** The days on which invented rules begin and end. */
export const DAYS = [day('2020-01-01'), day('2024-02-29'), day('2026-12-01'), day('2030-07-15')] as const;

const LAYERS = ['care', 'qq', 'qq-x'] as const;
const PLACES: readonly Place[] = [
  { code: 'qqq', line: ['qqq'] },
  { code: 'aa', line: ['qqq', 'aa'] },
  { code: 'bb', line: ['qqq', 'bb'] },
  { code: 'cc', line: ['cc'] },
  { code: 'cc-n', line: ['cc', 'cc-n'] },
];
/** Codes that rules name; no sheet lists "zz". */
const NAMED = ['qqq', 'aa', 'cc', 'cc-n', 'zz'] as const;
const ANSWERED = ['aa', 'bb', 'cc', 'cc-n', 'zz', 'cc-unlisted', 'yy', 'aa-south'] as const;
const OPTIONS = ['red', 'green', 'blue'] as const;

type Pool = {
  readonly unit: Unit;
  readonly bounds: readonly [Threshold, ...Threshold[]];
  readonly values: readonly [number | string, ...(number | string)[]];
};
const POOLS: readonly [Pool, ...Pool[]] = [
  {
    unit: 'mm',
    bounds: [
      { value: 25, unit: 'mm' },
      { value: 2.5, unit: 'cm' },
      { value: 40, unit: 'mm' },
    ],
    values: [25, '25.000001', 24.999999, 30, '40', 41, 39.999999, 0, '25.0'],
  },
  {
    unit: 'mL',
    bounds: [
      { value: 3, unit: 'L' },
      { value: 1100, unit: 'mL' },
      { value: 3000, unit: 'mL' },
    ],
    values: [3000, 1100, '3000.000001', 2999.999999, 1099.999999, '1100.0000001', 5],
  },
  {
    unit: 'kg',
    bounds: [
      { value: 500, unit: 'g' },
      { value: 0.8, unit: 'kg' },
    ],
    values: ['0.5', 0.500001, 0.499999, 0.8, '0.800001', 2, '0'],
  },
];
const MONEY = {
  EUR: { value: 50, amounts: ['50', '50.01', '49.99'] },
  DKK: { value: 400, amounts: ['400.00', '400.01', '399.99'] },
} as const;
const CURRENCIES = ['EUR', 'DKK'] as const;

const MOST_WORLDS = 320;
type Asked = { readonly question: Question; readonly facts: number };

function questionFrom(draws: Draws, at: number): Asked {
  const own = { id: `q${at}`, topic: 'use' } as const;
  switch (draws.below(9)) {
    case 0:
    case 1:
      return { question: { ...own, kind: 'choice', options: OPTIONS }, facts: 3 };
    case 2:
      return { question: { ...own, kind: 'several', options: ['matt', 'gloss'] }, facts: 4 };
    case 3:
    case 4:
      return { question: { ...own, kind: 'amount', unit: draws.from(POOLS).unit }, facts: 5 };
    case 5:
      return { question: { ...own, kind: 'money' }, facts: 9 };
    case 6:
      return { question: { ...own, kind: 'region' }, facts: 7 };
    default:
      return { question: { ...own, kind: 'yesno' }, facts: 2 };
  }
}

function questionsFrom(draws: Draws): readonly Question[] {
  const asked: Question[] = [];
  let worlds = 1;
  for (let at = 0; at < 6; at += 1) {
    const { question, facts } = questionFrom(draws, at);
    if (worlds * facts > MOST_WORLDS) continue;
    worlds *= facts;
    asked.push(question);
  }
  // Gates look one way along the list, so that none can run in a circle.
  const lookBack = draws.chance(70);
  return asked.map((question, at) => {
    const others = (lookBack ? asked.slice(0, at) : asked.slice(at + 1)).filter(hasOptions);
    const other = draws.chance(30) ? draws.from(others) : undefined;
    if (other === undefined) return question;
    const options = draws.some(other.options, 60);
    return { ...question, askIf: { question: other.id, in: options.length > 0 ? options : other.options.slice(0, 1) } };
  });
}

const hasOptions = (question: Question): question is Extract<Question, { readonly kind: 'choice' | 'several' }> =>
  question.kind === 'choice' || question.kind === 'several';

type Ground = { readonly draws: Draws; readonly questions: readonly Question[]; readonly terms: readonly string[] };

function leafFrom({ draws, questions, terms }: Ground): Condition {
  const term = draws.chance(20) ? draws.from(terms) : undefined;
  if (term !== undefined) return { term };
  const question = draws.from(questions);
  if (question === undefined) return true;
  const own = { question: question.id };
  switch (question.kind) {
    case 'yesno':
      return { ...own, is: draws.chance(50) };
    case 'choice':
    case 'several': {
      const option = draws.from(question.options) ?? '';
      return draws.chance(60) ? { ...own, is: option } : { ...own, in: [option, draws.from(question.options) ?? ''] };
    }
    case 'region':
      return { ...own, within: draws.from(NAMED) };
    case 'amount':
      return compareFrom(draws, question.id, draws.from(POOLS.find(({ unit }) => unit === question.unit)?.bounds ?? POOLS[0].bounds));
    case 'money': {
      const currency = draws.from(CURRENCIES);
      return compareFrom(draws, question.id, { value: MONEY[currency].value, unit: currency });
    }
  }
}

function compareFrom(draws: Draws, question: string, bound: Threshold): Condition {
  const all: readonly [Condition, ...Condition[]] = [
    { question, lt: bound },
    { question, le: bound },
    { question, gt: bound },
    { question, ge: bound },
  ];
  return draws.from(all);
}

function conditionFrom(ground: Ground, level: number): Condition {
  const { draws } = ground;
  const kind = draws.below(level === 0 ? 9 : 12);
  if (level === 2 || kind > 8) return leafFrom(ground);
  const part = (): Condition => conditionFrom(ground, level + 1);
  if (kind < 3) return { all: [part(), part()] };
  if (kind < 5) return { any: [part(), part()] };
  if (kind === 5) return { not: part() };
  if (kind === 6) return { all: [leafFrom(ground), part(), { not: leafFrom(ground) }] };
  return kind === 7 && draws.chance(25) ? draws.chance(80) : leafFrom(ground);
}

/** Two versions that meet on one of the days, so that one is in force on any day; a term uses only those before it. */
function termsFrom(ground: Ground, region: string): readonly EngineTerm[] {
  const { draws, terms } = ground;
  return terms.flatMap((id, at): readonly EngineTerm[] => {
    if (region !== 'care' && draws.chance(70)) return [];
    const own = { ...ground, terms: terms.slice(0, at) };
    const turn = draws.chance(30) ? draws.from(DAYS) : null;
    const early = { id, region, when: conditionFrom(own, 1), from: null, to: turn };
    return turn === null ? [early] : [early, { id, region, when: conditionFrom(own, 1), from: turn, to: null }];
  });
}

const ruleId = (at: number): string => `r${at}`;

/** Rules are numbered by rank, so that an attack on a smaller number goes down. */
function ruleFrom(ground: Ground, at: number, earlier: readonly EngineRule[], region: string): EngineRule {
  const { draws } = ground;
  const targets = draws.some(earlier.filter((rule) => !rule.firm || rule.region === region).slice(-4), 40);
  const kind = targets.length === 0 ? 'adds' : draws.from(['replaces', 'excepts'] as const);
  return {
    id: ruleId(at),
    region,
    kind,
    targets: kind === 'adds' ? [] : [...targets.map(({ id }) => id), ...draws.some(['gone'], 10)],
    alongside: kind === 'replaces' ? draws.some([ruleId(at - 1), ruleId(at + 1)], 60) : [],
    when: conditionFrom(ground, 0),
    from: draws.chance(25) ? draws.from([DAYS[0], DAYS[1], DAYS[2]]) : null,
    to: draws.chance(15) ? DAYS[3] : null,
    order: at,
    firm: draws.chance(8),
  };
}

function layersFrom(ground: Ground): readonly Layer[] {
  const { draws } = ground;
  const rules: EngineRule[] = [];
  const regions = LAYERS.slice(0, 1 + draws.from([0, 1, 1, 2, 2]));
  return regions.map((region) => {
    const first = rules.length;
    const count = 1 + draws.below(3);
    for (let at = first; at < first + count; at += 1) rules.push(ruleFrom(ground, at, rules, region));
    return { region, rules: rules.slice(first), terms: termsFrom(ground, region) };
  });
}

function truthFrom(draws: Draws, question: Question): AnswerValue {
  switch (question.kind) {
    case 'yesno':
      return draws.chance(50);
    case 'choice':
      return draws.from(question.options) ?? '';
    case 'several':
      return draws.some(question.options, 50);
    case 'region':
      return draws.from(ANSWERED);
    case 'amount':
      return draws.from(POOLS.find(({ unit }) => unit === question.unit)?.values ?? POOLS[0].values);
    case 'money':
      return CURRENCIES.map((currency) => ({ amount: draws.from(MONEY[currency].amounts), currency }));
  }
}

const MANY = [
  { amount: '50.00', currency: 'EUR' },
  { amount: '3', currency: 'JPY' },
];

function strangeFrom(draws: Draws, question: Question, truth: AnswerValue): AnswerValue {
  if (!draws.chance(50)) return truth;
  const wrong: readonly [AnswerValue, ...AnswerValue[]] = [
    'violet',
    true,
    7,
    ['violet'],
    ['none', 'matt'],
    { amount: 'much', currency: 'EUR' },
  ];
  if (question.kind === 'region') return draws.from(['qqq', 'cc-n-e', 'zzz', '', 'qqq-1']);
  if (question.kind === 'several' && draws.chance(50)) return ['none'];
  const other: readonly [AnswerValue, ...AnswerValue[]] = [{ amount: '9', currency: 'JPY' }, { amount: '400', currency: 'DKK' }, [], MANY];
  return draws.from(question.kind === 'money' ? other : wrong);
}

function caseFrom(draws: Draws, more: readonly number[]): Case {
  const questions = questionsFrom(draws);
  const layers = layersFrom({ draws, questions, terms: ['t0', 't1', 't2'].slice(0, draws.below(4)) });
  const rules = layers.flatMap((layer) => layer.rules.map(({ id }) => id));
  const on = draws.from([DAYS[1], DAYS[2], DAYS[3]]);
  const input: LineInput = { questions, layers, except: draws.chance(20) ? draws.some(rules, 20) : [], on, places: PLACES };
  const truths = questions.map((question) => ({ question, truth: truthFrom(draws, question) }));
  const half = truths.filter(() => draws.chance(50));
  const asAnswers = (list: readonly { readonly question: Question; readonly truth: AnswerValue }[]): Answers =>
    Object.fromEntries(list.map(({ question, truth }) => [question.id, truth]));
  const answers = asAnswers(half);
  const declined = draws.some(questions, 40).flatMap(({ id }) => (Object.hasOwn(answers, id) ? [] : [id]));
  const strange = asAnswers(half.map(({ question, truth }) => ({ question, truth: strangeFrom(draws, question, truth) })));
  return { input, whole: asAnswers(truths), answers, strange, declined, draws: more };
}
