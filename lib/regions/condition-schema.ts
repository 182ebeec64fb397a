import { z } from 'zod';
import { QUESTIONS, type Question } from '@/lib/checks/domain/questions';
import { baseUnit, isCurrency } from '@/lib/kernel/quantity';
import type { Condition } from './domain/condition';
import { regionCode, slug } from './word-schema';

const LIST: readonly Question[] = QUESTIONS;
const BY_ID = new Map(LIST.map((question) => [question.id, question]));

const threshold = z.strictObject({ value: z.number().nonnegative(), unit: z.string() });
const questionId = z.string().refine((id) => BY_ID.has(id), { error: 'There is no question of this id' });

const leaf = z.union([
  z.strictObject({ question: questionId, is: z.union([z.string(), z.boolean()]) }),
  z.strictObject({ question: questionId, in: z.array(z.string()).min(1) }),
  z.strictObject({ question: questionId, lt: threshold }),
  z.strictObject({ question: questionId, le: threshold }),
  z.strictObject({ question: questionId, gt: threshold }),
  z.strictObject({ question: questionId, ge: threshold }),
  z.strictObject({ question: questionId, within: regionCode }),
  z.strictObject({ term: slug }),
]);

const tree: z.ZodType<Condition> = z.lazy(() =>
  z.union(
    [
    z.boolean(),
    z.strictObject({ all: z.array(tree).min(1) }),
    z.strictObject({ any: z.array(tree).min(1) }),
    z.strictObject({ not: tree }),
    leaf,
  ],
    { error: 'A condition is true, false, {"all":[…]}, {"any":[…]}, {"not":…}, {"term":…}, or a question with is, in, lt, le, gt, ge or within' },
  ),
);

type Question_ = { readonly question: string };
const asks = (condition: Condition): condition is Extract<Condition, Question_> =>
  typeof condition === 'object' && 'question' in condition;

const partsOf = (condition: Condition): readonly Condition[] => {
  if (typeof condition === 'boolean') return [];
  if ('all' in condition) return condition.all;
  if ('any' in condition) return condition.any;
  return 'not' in condition ? [condition.not] : [];
};
const depthOf = (condition: Condition): number => 1 + Math.max(0, ...partsOf(condition).map(depthOf));
const leavesOf = (condition: Condition): readonly Condition[] => {
  const parts = partsOf(condition);
  return parts.length === 0 ? [condition] : parts.flatMap(leavesOf);
};

const boundOf = (node: Extract<Condition, Question_>): { readonly unit: string } | null => {
  if ('lt' in node) return node.lt;
  if ('le' in node) return node.le;
  if ('gt' in node) return node.gt;
  return 'ge' in node ? node.ge : null;
};

/** Null when the leaf asks its question in a way that question can be asked, else what is wrong. */
function faultOfLeaf(node: Extract<Condition, Question_>): string | null {
  const question = BY_ID.get(node.question);
  if (question === undefined) return `There is no question "${node.question}"`;
  const bound = boundOf(node);
  switch (question.kind) {
    case 'yesno':
      return 'is' in node && typeof node.is === 'boolean' ? null : `"${question.id}" is answered yes or no: use {"is":true} or {"is":false}`;
    case 'choice':
    case 'several': {
      const values: readonly (string | boolean)[] = 'is' in node ? [node.is] : 'in' in node ? node.in : [];
      const strange = values.find((value) => typeof value !== 'string' || !question.options.includes(value));
      if (values.length === 0 || strange !== undefined) return `"${question.id}" takes one of: ${question.options.join(', ')}`;
      return null;
    }
    case 'amount':
      return bound !== null && baseUnit(bound.unit) === baseUnit(question.unit)
        ? null
        : `"${question.id}" is compared (lt, le, gt, ge) with a value in ${question.unit}`;
    case 'money':
      return bound !== null && isCurrency(bound.unit) ? null : `"${question.id}" is compared with an amount in a currency, such as DKK`;
    case 'region':
      return 'within' in node ? null : `"${question.id}" asks {"within": a region code}`;
  }
}

export const condition = tree.superRefine((value, ctx) => {
  if (depthOf(value) > 5) ctx.addIssue({ code: 'custom', message: 'At most 4 levels of all, any and not; define a term for the rest' });
  const leaves = leavesOf(value);
  if (leaves.length > 40) ctx.addIssue({ code: 'custom', message: 'At most 40 lines; define a term for the rest' });
  for (const node of leaves) {
    const fault = asks(node) ? faultOfLeaf(node) : null;
    if (fault !== null) ctx.addIssue({ code: 'custom', message: fault });
  }
});
