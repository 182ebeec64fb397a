import type { Json } from '@/lib/kernel/canonical-json';
import { isCurrency, millionths, type Money } from '@/lib/kernel/quantity';
import type { AnswerValue } from './knowledge';
import type { Question } from './questions';

const CODE = /^[a-z][a-z0-9]{1,9}(-[a-z0-9]{1,6})?$/;

/** A value written as the API takes it, as an answer to this question; null when it is none. Stricter than judging, which takes it as not said. */
export function typedAnswer(question: Question, value: Json): AnswerValue | null {
  switch (question.kind) {
    case 'yesno':
      return typeof value === 'boolean' ? value : null;
    case 'choice':
      return textOf(value, (option) => question.options.includes(option));
    case 'several':
      return severalOf(value, question.options);
    case 'amount':
      return numberOf(value, question.unit);
    case 'money':
      return moneyOf(value);
    case 'region':
      return textOf(value, (code) => CODE.test(code));
  }
}

const textOf = (value: Json, fits: (text: string) => boolean): string | null => (typeof value === 'string' && fits(value) ? value : null);

const numberOf = (value: Json, unit: string): number | null =>
  typeof value === 'number' && value >= 0 && millionths(value, unit) !== null ? value : null;

function severalOf(value: Json, options: readonly string[]): readonly string[] | null {
  if (!isList(value)) return null;
  const chosen = value.flatMap((option) => (typeof option === 'string' ? option : []));
  if (chosen.length !== value.length || new Set(chosen).size !== chosen.length) return null;
  if (chosen.includes('none')) return chosen.length === 1 ? chosen : null;
  return chosen.every((option) => options.includes(option)) ? chosen : null;
}

function moneyOf(value: Json): readonly Money[] | null {
  const list = isList(value) ? value : [value];
  const amounts = list.flatMap((item) => amountOf(item) ?? []);
  const currencies = new Set(amounts.map(({ currency }) => currency));
  return amounts.length > 0 && amounts.length === list.length && currencies.size === list.length ? amounts : null;
}

function amountOf(value: Json): Money | null {
  if (!isObject(value)) return null;
  const { amount, currency, ...rest } = value;
  if (typeof amount !== 'string' || typeof currency !== 'string' || Object.keys(rest).length > 0) return null;
  return /^\d{1,12}(\.\d{1,6})?$/.test(amount) && isCurrency(currency) ? { amount, currency } : null;
}

const isObject = (value: Json): value is { readonly [key: string]: Json } => value !== null && typeof value === 'object' && !isList(value);
const isList = (value: Json): value is readonly Json[] => Array.isArray(value);
