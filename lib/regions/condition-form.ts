import type { Question } from '@/lib/checks/domain/questions';
import { readDecimal } from '@/lib/checks/domain/spoken-answer';
import { words } from '@/lib/kernel/words';
import type { Condition } from './domain/condition';
import { askedBy, conditionIn, ROOT, waysOf, type EntryBlock, type EntryLine, type EntryPart, type Join } from './domain/condition-entry';
import type { Entry } from './domain/entry';

/** A condition out of a form, and what is missing, by field. Where there are faults the condition is not to be used. */
export type ReadCondition = { readonly value: Condition; readonly faults: Readonly<Record<string, string>> };

type Faults = Map<string, string>;

/** Reads the tree that a form holds. A block with one part is that part. */
export function readCondition(entry: Entry): ReadCondition {
  const { join, parts } = conditionIn(entry);
  if (join === 'always') return { value: true, faults: {} };
  const faults: Faults = new Map();
  const value = blockOf({ join, parts, path: ROOT }, faults);
  return { value, faults: Object.fromEntries(faults) };
}

function blockOf({ join, parts, path }: Pick<EntryBlock, 'join' | 'parts' | 'path'>, faults: Faults): Condition {
  if (parts.length === 0) faults.set(`${path}.join`, words('amend.fault.emptyBlock'));
  return joined(
    join,
    parts.map((part) => partOf(part, faults)),
  );
}

const partOf = (part: EntryPart, faults: Faults): Condition => (part.kind === 'block' ? blockOf(part, faults) : lineOf(part, faults));

function joined(join: Join, parts: readonly Condition[]): Condition {
  const [only] = parts;
  const isOne = parts.length === 1 && only !== undefined;
  if (join === 'unless') return { not: isOne ? only : { any: parts } };
  if (isOne) return only;
  return join === 'all' ? { all: parts } : { any: parts };
}

/** What a line says; `true` where it cannot be said yet, with the fault noted. */
function lineOf(line: EntryLine, faults: Faults): Condition {
  const fault = (field: 'question' | 'by' | 'value' | 'unit' | 'values', said: string): Condition => {
    faults.set(`${line.path}.${field}`, said);
    return true;
  };
  const asked = askedBy(line.question);
  if (asked === null) return fault('question', words('amend.fault.question'));
  if (!waysOf(asked).includes(line.by)) return fault('by', words('amend.fault.by'));
  switch (asked.kind) {
    case 'yesno':
      return { question: asked.id, is: line.by === 'yes' };
    case 'choice':
    case 'several':
      return optionsOf(asked, line) ?? fault('values', words('amend.fault.options'));
    case 'region':
      return line.value === ''
        ? fault('value', words('amend.fault.place'))
        : denied(line.by === 'not-within', { question: asked.id, within: line.value });
    case 'term':
      return line.value === '' ? fault('value', words('amend.fault.term')) : denied(line.by === 'holds-not', { term: line.value });
    case 'amount':
    case 'money':
      return boundOf(asked.id, line, fault);
  }
}

const denied = (isDenied: boolean, condition: Condition): Condition => (isDenied ? { not: condition } : condition);

type Options = Extract<Question, { readonly options: readonly string[] }>;

function optionsOf({ id, options }: Options, { by, values }: EntryLine): Condition | null {
  const chosen = values.filter((option) => options.includes(option));
  const [first] = chosen;
  if (first === undefined) return null;
  return denied(by === 'is-not', chosen.length === 1 ? { question: id, is: first } : { question: id, in: chosen });
}

function boundOf(question: string, line: EntryLine, fault: (field: 'value' | 'unit', said: string) => Condition): Condition {
  const value = numberIn(line.value);
  if (value === null) return fault('value', words('amend.fault.amount'));
  if (line.unit === '') return fault('unit', words('amend.fault.unit'));
  const bound = { value, unit: line.unit };
  switch (line.by) {
    case 'lt':
      return { question, lt: bound };
    case 'le':
      return { question, le: bound };
    case 'gt':
      return { question, gt: bound };
    default:
      return { question, ge: bound };
  }
}

/** A number as people type it, comma or point; null where it is none, or could be two. */
export function numberIn(typed: string): number | null {
  const read = readDecimal(typed);
  return read.ok ? Number(read.value) : null;
}

/** The fields of a condition as it stands. */
export function writeCondition(condition: Condition): Entry {
  if (condition === true) return { [`${ROOT}.join`]: 'always' };
  const { join, parts } = blockIn(condition);
  return Object.fromEntries([[`${ROOT}.join`, join], ...parts.flatMap((part, place) => partFields(part, `${ROOT}.${String(place)}`))]);
}

type Fields = readonly (readonly [string, string | readonly string[]])[];

/** A condition as a block; what is none becomes the one part of one. "Never" is an empty one, which has to be filled. */
function blockIn(condition: Condition): { readonly join: Join; readonly parts: readonly Condition[] } {
  if (typeof condition === 'boolean') return { join: 'all', parts: [] };
  if ('all' in condition) return { join: 'all', parts: condition.all };
  if ('any' in condition) return { join: 'any', parts: condition.any };
  if ('not' in condition && lineFields(condition) === null) {
    const { not } = condition;
    return { join: 'unless', parts: typeof not === 'object' && 'any' in not ? not.any : [not] };
  }
  return { join: 'all', parts: [condition] };
}

function partFields(condition: Condition, path: string): Fields {
  const line = lineFields(condition);
  if (line !== null) return Object.entries(line).map(([name, value]) => [`${path}.${name}`, value]);
  const { join, parts } = blockIn(condition);
  return [[`${path}.join`, join], ...parts.flatMap((part, place) => partFields(part, `${path}.${String(place)}`))];
}

type Line = {
  readonly question: string;
  readonly by: string;
  readonly value?: string;
  readonly unit?: string;
  readonly values?: readonly string[];
};

/** The fields of a condition that one line can say; null for one that needs a block. */
function lineFields(condition: Condition): Line | null {
  if (typeof condition === 'boolean') return null;
  if ('term' in condition) return { question: 'term', by: 'holds', value: condition.term };
  if ('question' in condition) return leafFields(condition);
  if (!('not' in condition)) return null;
  return denialFields(condition.not);
}

const DENIALS: Readonly<Record<string, string>> = { is: 'is-not', within: 'not-within', holds: 'holds-not' };

/** "Is not", "is not within" and "does not hold" are lines of their own; other denials are blocks. */
function denialFields(inner: Condition): Line | null {
  if (typeof inner !== 'object' || !('term' in inner || 'question' in inner)) return null;
  const line = lineFields(inner);
  const by = line === null ? undefined : DENIALS[line.by];
  return line === null || by === undefined ? null : { ...line, by };
}

type Leaf = Extract<Condition, { readonly question: string }>;

function leafFields(leaf: Leaf): Line {
  const { question } = leaf;
  if ('is' in leaf)
    return typeof leaf.is === 'boolean' ? { question, by: leaf.is ? 'yes' : 'no' } : { question, by: 'is', values: [leaf.is] };
  if ('in' in leaf) return { question, by: 'is', values: leaf.in };
  if ('within' in leaf) return { question, by: 'within', value: leaf.within };
  const [by, { value, unit }] = boundIn(leaf);
  return { question, by, value: String(value), unit };
}

type Bound = Exclude<Leaf, { readonly is: unknown } | { readonly in: unknown } | { readonly within: unknown }>;

function boundIn(leaf: Bound): readonly ['lt' | 'le' | 'gt' | 'ge', { readonly value: number; readonly unit: string }] {
  if ('lt' in leaf) return ['lt', leaf.lt];
  if ('le' in leaf) return ['le', leaf.le];
  return 'gt' in leaf ? ['gt', leaf.gt] : ['ge', leaf.ge];
}
