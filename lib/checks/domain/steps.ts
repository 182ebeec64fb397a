import { QUESTIONS, type Question, type QuestionId } from './questions';

/** Questions measured or known together are asked on one page; every other question has a page of its own. */
const TOGETHER: readonly (readonly QuestionId[])[] = [
  ['could-hold-food', 'unfit-by-design'],
  ['depth-mm', 'capacity-ml'],
  ['drinking-rim', 'rim-decorated'],
  ['lidded', 'metal-parts'],
  ['cooked-in', 'packaging-or-storage'],
  ['for-children', 'one-off'],
  ['body', 'firing', 'peak-c'],
  ['inside', 'outside-glazed'],
  ['lead-or-cadmium-in-materials', 'materials-documented', 'lead-history'],
  ['changed-since-test', 'firing-recorded'],
  ['importer', 'carrier', 'ioss'],
  ['pieces-a-year', 'turnover-a-year', 'cross-border-turnover-a-year'],
];

const LIST: readonly Question[] = QUESTIONS;

export function findQuestion(id: string): Question | null {
  return LIST.find((question) => question.id === id) ?? null;
}

/** The questions of the page that asks this one, in the order of asking. */
export function pageOf(id: string): readonly Question[] {
  const together: readonly string[] = TOGETHER.find((group) => group.some((member) => member === id)) ?? [id];
  return LIST.filter((question) => together.includes(question.id));
}

/** The questions of that page that are worth showing: the one asked for, what still matters, and what has been said already. */
export function shownOn(id: string, matters: readonly string[], said: readonly string[]): readonly Question[] {
  return pageOf(id).filter((question) => question.id === id || matters.includes(question.id) || said.includes(question.id));
}

/** What the form suggests of other questions. Shown as suggestion only: nothing is inferred until the maker says so. */
export function suggestedBy(form: unknown, question: string): boolean | null {
  if (typeof form !== 'string') return null;
  const known = SUGGESTED[question];
  if (known === undefined) return null;
  if (known.yes.includes(form)) return true;
  return known.no.includes(form) ? false : null;
}

const DRUNK_FROM = ['mug', 'cup', 'tumbler'];
const COOKED_IN = ['baking-dish', 'casserole'];
const FLAT = ['plate', 'saucer', 'platter', 'tile', 'spoon-rest'];

const SUGGESTED: Readonly<Record<string, { readonly yes: readonly string[]; readonly no: readonly string[] }>> = {
  'holds-liquid': {
    yes: [...DRUNK_FROM, ...COOKED_IN, 'bowl', 'jug', 'creamer', 'teapot', 'coffee-pot', 'jar', 'bottle', 'vase'],
    no: ['tile'],
  },
  'drinking-rim': { yes: DRUNK_FROM, no: [...FLAT, ...COOKED_IN, 'jug', 'creamer', 'teapot', 'coffee-pot', 'jar', 'vase'] },
  'cooked-in': { yes: COOKED_IN, no: [...DRUNK_FROM, 'saucer', 'tile', 'spoon-rest', 'vase'] },
};
