import { z } from 'zod';
import { QUESTIONS, type Question } from '@/lib/checks/domain/questions';
import { baseUnit, isCurrency } from '@/lib/kernel/quantity';
import type { Condition } from './domain/condition';
import { regionCode, slug } from '@/lib/kernel/shapes';

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
    {
      error:
        'A condition is true, false, {"all":[…]}, {"any":[…]}, {"not":…}, {"term":…}, or a question with is, in, lt, le, gt, ge or within',
    },
  ),
);

const asks = (condition: Condition): condition is Leaf => typeof condition === 'object' && 'question' in condition;

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

type Leaf = Extract<Condition, { readonly question: string }>;

const boundOf = (node: Leaf): { readonly unit: string } | null => {
  if ('lt' in node) return node.lt;
  if ('le' in node) return node.le;
  if ('gt' in node) return node.gt;
  return 'ge' in node ? node.ge : null;
};

const valuesOf = (node: Leaf): readonly (string | boolean)[] => {
  if ('is' in node) return [node.is];
  return 'in' in node ? node.in : [];
};

/** Whether the leaf names options of its question, and nothing else. */
const namesOptions = (node: Leaf, options: readonly string[]): boolean => {
  const values = valuesOf(node);
  return values.length > 0 && values.every((value) => typeof value === 'string' && options.includes(value));
};

const isYesNo = (node: Leaf): boolean => 'is' in node && typeof node.is === 'boolean';
const boundUnit = (node: Leaf): string | null => boundOf(node)?.unit ?? null;

/** Null when the leaf asks its question in a way that question can be asked, else what is wrong. */
function faultOfLeaf(node: Leaf): string | null {
  const question = BY_ID.get(node.question);
  if (question === undefined) return `There is no question "${node.question}"`;
  return isAskedRight(question, node) ? null : howToAsk(question);
}

function isAskedRight(question: Question, node: Leaf): boolean {
  switch (question.kind) {
    case 'yesno':
      return isYesNo(node);
    case 'choice':
    case 'several':
      return namesOptions(node, question.options);
    case 'amount':
      return baseUnit(boundUnit(node) ?? '') === baseUnit(question.unit);
    case 'money':
      return isCurrency(boundUnit(node) ?? '');
    case 'region':
      return 'within' in node;
  }
}

function howToAsk(question: Question): string {
  switch (question.kind) {
    case 'yesno':
      return `"${question.id}" is answered yes or no: use {"is":true} or {"is":false}`;
    case 'choice':
    case 'several':
      return `"${question.id}" takes one of: ${question.options.join(', ')}`;
    case 'amount':
      return `"${question.id}" is compared (lt, le, gt, ge) with a value in ${question.unit}`;
    case 'money':
      return `"${question.id}" is compared with an amount in a currency, such as DKK`;
    case 'region':
      return `"${question.id}" asks {"within": a region code}`;
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
