import { millionths, type Money } from '@/lib/kernel/quantity';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { AnswerValue } from './knowledge';
import type { Question } from './questions';

/** What a form sent for one question, as it was typed and ticked. */
export type Spoken = {
  readonly chosen: readonly string[];
  readonly typed: string;
  /** Money has a field for each currency that a rule names. */
  readonly money: readonly { readonly currency: string; readonly typed: string }[];
  readonly unknown: boolean;
};

/** `partly`: money was given in some of the currencies asked for, so the question stays open in the others. */
export type Understood =
  | { readonly kind: 'answered'; readonly value: AnswerValue; readonly partly: boolean }
  | { readonly kind: 'declined' }
  | { readonly kind: 'nothing' };

/** Why an entry was not understood; the page turns each into words that say how to mend it. */
export type Misread =
  'both-said' | 'not-an-option' | 'none-and-more' | 'not-a-number' | 'thousands-unclear' | 'not-whole' | 'too-large' | 'not-a-place';

const WHOLE = new Set(['pieces', 'people']);
const MOST = 1_000_000_000_000n * 1_000_000n;

/**
 * A decimal number as people type it: comma or point before the decimals, spaces between thousands. One mark followed by
 * exactly three digits could be either, so it is refused rather than guessed.
 */
export function readDecimal(typed: string): Result<string, Misread> {
  const text = typed.normalize('NFKC').replaceAll(/\s/g, '');
  if (text.length > 40 || !/^\d+([.,]\d+)?$/.test(text)) return err('not-a-number');
  if (/^[1-9]\d{0,2}[.,]\d{3}$/.test(text)) return err('thousands-unclear');
  return ok(text.replace(',', '.'));
}

/** The answer to one question out of what a form sent. An empty entry is nothing said; it never counts as "no". */
export function understand(question: Question, spoken: Spoken): Result<Understood, Misread> {
  const filled = spoken.money.filter(({ typed }) => typed.trim() !== '');
  const said = spoken.chosen.length > 0 || spoken.typed.trim() !== '' || filled.length > 0;
  if (spoken.unknown) return said ? err('both-said') : ok({ kind: 'declined' });
  if (!said) return ok({ kind: 'nothing' });
  const value = valueOf(question, spoken);
  return value.ok ? ok({ kind: 'answered', value: value.value, partly: filled.length > 0 && filled.length < spoken.money.length }) : value;
}

function valueOf(question: Question, { chosen, typed, money }: Spoken): Result<AnswerValue, Misread> {
  const [first = ''] = chosen;
  switch (question.kind) {
    case 'yesno':
      return first === 'yes' || first === 'no' ? ok(first === 'yes') : err('not-an-option');
    case 'choice':
      return question.options.includes(first) ? ok(first) : err('not-an-option');
    case 'several':
      return severalOf(question.options, chosen);
    case 'amount':
      return amountOf(typed, question.unit);
    case 'money':
      return moneyOf(money.filter((field) => field.typed.trim() !== ''));
    case 'region':
      return /^[a-z]{2}(-[a-z0-9]{1,3})?$/.test(first) ? ok(first) : err('not-a-place');
  }
}

function severalOf(options: readonly string[], chosen: readonly string[]): Result<AnswerValue, Misread> {
  if (chosen.includes('none')) return chosen.length === 1 ? ok([]) : err('none-and-more');
  return chosen.every((option) => options.includes(option))
    ? ok(options.filter((option) => chosen.includes(option)))
    : err('not-an-option');
}

function amountOf(typed: string, unit: string): Result<AnswerValue, Misread> {
  const text = readDecimal(typed);
  if (!text.ok) return text;
  const exact = millionths(text.value, unit);
  if (exact === null) return err('not-a-number');
  if (exact > MOST) return err('too-large');
  if (WHOLE.has(unit) && exact % 1_000_000n !== 0n) return err('not-whole');
  return ok(Number(text.value));
}

function moneyOf(fields: Spoken['money']): Result<AnswerValue, Misread> {
  const amounts: Money[] = [];
  for (const { currency, typed } of fields) {
    const text = readDecimal(typed);
    if (!text.ok) return text;
    const exact = millionths(text.value, currency);
    if (exact === null) return err('not-a-number');
    if (exact > MOST) return err('too-large');
    amounts.push({ amount: text.value, currency });
  }
  return ok(amounts);
}
