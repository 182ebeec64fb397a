import { isCurrency } from '@/lib/kernel/quantity';
import { LOCALE, words, wordsAt } from '@/lib/kernel/words';
import type { Condition, Threshold } from './condition';
import { sayMoney, sayUnit } from './figure-words';
import type { SheetNames } from './sheet-names';

/**
 * A condition as a reader meets it: a line, or a list with its head. `unless` holds what, in a list of which all must be
 * true, was said by a denial: the list holds and none of these does.
 */
export type SaidCondition =
  | { readonly kind: 'always' }
  | { readonly kind: 'never' }
  | { readonly kind: 'line'; readonly text: string; readonly term?: string }
  | {
      readonly kind: 'list';
      readonly join: 'all' | 'any' | 'none' | 'not-all';
      readonly parts: readonly SaidCondition[];
      readonly unless: readonly SaidCondition[];
    };

type Leaf = Extract<Condition, { readonly question: string }>;
type Named = { readonly names: SheetNames };

const OR = new Intl.ListFormat(LOCALE, { type: 'disjunction' });

/** The condition as lines and lists. Says the same as the tree: denials are moved inwards, nothing is dropped. */
export function sayCondition(condition: Condition, names: SheetNames): SaidCondition {
  const plain = withoutDenials(condition);
  if (typeof plain === 'boolean') return { kind: plain ? 'always' : 'never' };
  if ('all' in plain) return sayAll(plain.all, { names });
  if ('any' in plain) return { kind: 'list', join: 'any', parts: plain.any.map((part) => sayCondition(part, names)), unless: [] };
  if ('not' in plain) return sayDenial(plain.not, { names });
  return 'term' in plain ? sayTerm(plain.term, { names }) : { kind: 'line', text: sayLeaf(plain, { names }) };
}

/** What can be said without a "not" is: "no" for not yes, "at most" for not more than. */
function withoutDenials(condition: Condition): Condition {
  if (typeof condition === 'boolean' || !('not' in condition)) return condition;
  const inner = withoutDenials(condition.not);
  if (typeof inner === 'boolean') return !inner;
  if ('not' in inner) return withoutDenials(inner.not);
  return 'question' in inner ? oppositeOf(inner) : { not: inner };
}

function oppositeOf(leaf: Leaf): Condition {
  const { question } = leaf;
  if ('is' in leaf && typeof leaf.is === 'boolean') return { question, is: !leaf.is };
  if ('lt' in leaf) return { question, ge: leaf.lt };
  if ('le' in leaf) return { question, gt: leaf.le };
  if ('gt' in leaf) return { question, le: leaf.gt };
  return 'ge' in leaf ? { question, lt: leaf.ge } : { not: leaf };
}

function sayAll(parts: readonly Condition[], { names }: Named): SaidCondition {
  const plain = parts.map(withoutDenials);
  const held = plain.filter((part) => !isDenial(part)).map((part) => sayCondition(part, names));
  const unless = plain.flatMap((part) => (isDenial(part) ? deniedParts(part.not) : [])).map((part) => sayCondition(part, names));
  if (held.length === 0) return { kind: 'list', join: 'none', parts: unless, unless: [] };
  const [only] = held;
  return held.length === 1 && unless.length === 0 && only !== undefined ? only : { kind: 'list', join: 'all', parts: held, unless };
}

/** "Unless a or b" is one list: the parts of a denied `any` stand beside the others. */
const deniedParts = (denied: Condition): readonly Condition[] => (typeof denied === 'object' && 'any' in denied ? denied.any : [denied]);

const isDenial = (condition: Condition): condition is { readonly not: Condition } => typeof condition === 'object' && 'not' in condition;

function sayDenial(denied: Condition, { names }: Named): SaidCondition {
  if (typeof denied === 'object' && 'all' in denied) {
    return { kind: 'list', join: 'not-all', parts: denied.all.map((part) => sayCondition(part, names)), unless: [] };
  }
  return { kind: 'list', join: 'none', parts: deniedParts(denied).map((part) => sayCondition(part, names)), unless: [] };
}

function sayTerm(id: string, { names }: Named): SaidCondition {
  return { kind: 'line', text: words('regions.condition.term', { name: names.terms.get(id)?.name ?? id }), term: id };
}

function sayLeaf(leaf: Leaf, { names }: Named): string {
  const name = wordsAt(`questions.${leaf.question}.short`) ?? leaf.question;
  if ('is' in leaf) return typeof leaf.is === 'boolean' ? sayYesNo(leaf.question, leaf.is) : sayOptions(leaf.question, [leaf.is]);
  if ('in' in leaf) return sayOptions(leaf.question, leaf.in);
  if ('within' in leaf)
    return words('regions.condition.within', { name, place: names.regions.get(leaf.within) ?? placeWords(leaf.within) });
  const [by, { value, unit }] = boundOf(leaf);
  return words(`regions.condition.${by}`, { name, amount: isCurrency(unit) ? sayMoney(String(value), unit) : sayUnit(value, unit) });
}

type Bound = Exclude<Leaf, { readonly is: unknown } | { readonly in: unknown } | { readonly within: unknown }>;

function boundOf(leaf: Bound): readonly ['lt' | 'le' | 'gt' | 'ge', Threshold] {
  if ('lt' in leaf) return ['lt', leaf.lt];
  if ('le' in leaf) return ['le', leaf.le];
  return 'gt' in leaf ? ['gt', leaf.gt] : ['ge', leaf.ge];
}

const sayYesNo = (question: string, answer: boolean): string => wordsAt(`questions.${question}.${answer ? 'yes' : 'no'}`) ?? question;

function sayOptions(question: string, options: readonly string[]): string {
  const said = options.map((option) =>
    words('regions.condition.option', { option: wordsAt(`questions.${question}.options.${option}`) ?? option }),
  );
  return words('regions.condition.options', { name: wordsAt(`questions.${question}.short`) ?? question, options: OR.format(said) });
}

const PLACES = new Intl.DisplayNames(LOCALE, { type: 'region' });

/** A place that has no sheet, by its ISO name; its code where it has none. */
export function placeWords(code: string): string {
  return /^[a-z]{2}$/.test(code) ? (PLACES.of(code.toUpperCase()) ?? code.toUpperCase()) : code.toUpperCase();
}
