import type { Condition } from '@/lib/regions/domain/condition';
import type { LoadedLine } from './checklist';

/** The currencies in which rules or terms of these lines compare a money question, in alphabetical order. */
export function currenciesOf(lines: readonly LoadedLine[], question: string): readonly string[] {
  const conditions = lines.flatMap(({ layers }) => layers.flatMap(({ sheet }) => [...sheet.rules, ...sheet.terms].map(({ when }) => when)));
  return [...new Set(conditions.flatMap((condition) => unitsIn(condition, question)))].sort();
}

function unitsIn(condition: Condition, question: string): readonly string[] {
  if (typeof condition === 'boolean') return [];
  if ('all' in condition) return condition.all.flatMap((part) => unitsIn(part, question));
  if ('any' in condition) return condition.any.flatMap((part) => unitsIn(part, question));
  if ('not' in condition) return unitsIn(condition.not, question);
  if (!('question' in condition) || condition.question !== question) return [];
  return ['lt', 'le', 'gt', 'ge'].flatMap((test) => unitOf(condition, test));
}

function unitOf(leaf: object, test: string): readonly string[] {
  const bound: unknown = Reflect.get(leaf, test);
  if (typeof bound !== 'object' || bound === null || !('unit' in bound)) return [];
  return typeof bound.unit === 'string' ? [bound.unit] : [];
}
