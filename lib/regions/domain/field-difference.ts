import { canonicalJson, type Json } from '@/lib/kernel/canonical-json';
import type { Condition } from './condition';
import type { PayloadLine } from './payload-lines';
import type { Citation } from './rule';
import { textDifference, type TextDifference } from './text-difference';
import type { TrialStatus } from './trial';

/** What a field of a sheet holds, ready to be put into words. Ids stand where a name depends on the rest of the line. */
export type FieldValue =
  | { readonly kind: 'text'; readonly text: string }
  | { readonly kind: 'texts'; readonly texts: readonly string[] }
  | { readonly kind: 'link'; readonly href: string }
  | { readonly kind: 'detail'; readonly line: PayloadLine }
  | { readonly kind: 'condition'; readonly of: 'rule' | 'term'; readonly condition: Condition }
  | { readonly kind: 'rules' | 'questions'; readonly ids: readonly string[] }
  | { readonly kind: 'citation'; readonly title: string; readonly citation: Citation }
  | { readonly kind: 'exceptions'; readonly except: readonly { readonly rule: string; readonly why: string }[] }
  | { readonly kind: 'answers'; readonly answers: Readonly<Record<string, Json>> }
  | { readonly kind: 'expected'; readonly expected: Readonly<Record<string, TrialStatus>> };

/** Fields by the names of their words, `editions.field.*`. */
export type FieldName =
  | 'title'
  | 'says'
  | 'when'
  | 'kind'
  | 'targets'
  | 'alongside'
  | 'dates'
  | 'firm'
  | 'strength'
  | 'standing'
  | 'topic'
  | 'detail'
  | 'source'
  | 'facts'
  | 'lookAgainBy'
  | 'note'
  | 'name'
  | 'category'
  | 'publisher'
  | 'identifier'
  | 'url'
  | 'versionDate'
  | 'seenOn'
  | 'seenVia'
  | 'fingerprint'
  | 'role'
  | 'evidence'
  | 'except'
  | 'on'
  | 'answers'
  | 'declined'
  | 'expected'
  | 'languages'
  | 'regionKind'
  | 'text'
  | 'why'
  | 'gaps';

/** A field that is otherwise in two versions. Null: that version has no such field. */
export type FieldDifference = {
  readonly field: FieldName;
  /** For details and sources, which there are several of: which one. */
  readonly name: string | null;
} & (
  | {
      readonly kind: 'values';
      readonly before: FieldValue | null;
      readonly after: FieldValue | null;
      /** The same items in another order. */
      readonly moved: boolean;
    }
  | { readonly kind: 'wording'; readonly difference: Exclude<TextDifference, { readonly kind: 'same' }> }
);

/** A field as it stands in one version. `words` are our own and are compared word by word. */
export type Field = {
  readonly field: FieldName;
  readonly name?: string;
  /** Tells fields of one name apart. */
  readonly key?: string;
} & ({ readonly words: string } | { readonly value: FieldValue });

/** The fields that differ, in the order of the later version; those that are gone come last. */
export function fieldDifferences(before: readonly Field[], after: readonly Field[]): readonly FieldDifference[] {
  const earlier = new Map(before.map((field) => [keyOf(field), field]));
  const later = new Map(after.map((field) => [keyOf(field), field]));
  return [...new Set([...later.keys(), ...earlier.keys()])].flatMap((key) => {
    const difference = differenceOf(earlier.get(key) ?? null, later.get(key) ?? null);
    return difference === null ? [] : [difference];
  });
}

const keyOf = ({ field, name, key }: Field): string => `${field} ${key ?? name ?? ''}`;

function differenceOf(before: Field | null, after: Field | null): FieldDifference | null {
  const shown = after ?? before;
  if (shown === null) return null;
  const own = { field: shown.field, name: shown.name ?? null };
  const wording = wordingOf(before, after);
  if (wording !== null) return wording.kind === 'same' ? null : { ...own, kind: 'wording', difference: wording };
  const [was, is] = [valueOf(before), valueOf(after)];
  return textOf(was) === textOf(is) ? null : { ...own, kind: 'values', before: was, after: is, moved: isMoved(was, is) };
}

function wordingOf(before: Field | null, after: Field | null): TextDifference | null {
  if (before === null || after === null) return null;
  return 'words' in before && 'words' in after ? textDifference(before.words, after.words) : null;
}

const valueOf = (field: Field | null): FieldValue | null => {
  if (field === null) return null;
  return 'words' in field ? { kind: 'text', text: field.words } : field.value;
};

const textOf = (value: FieldValue | null): string => canonicalJson(value);

/** Lists whose order is shown, and conditions, of which each part may stand anywhere. */
function isMoved(before: FieldValue | null, after: FieldValue | null): boolean {
  if (before === null || after === null) return false;
  return textOf(inOrder(before)) === textOf(inOrder(after));
}

function inOrder(value: FieldValue): FieldValue {
  switch (value.kind) {
    case 'texts':
      return { ...value, texts: value.texts.toSorted() };
    case 'rules':
    case 'questions':
      return { ...value, ids: value.ids.toSorted() };
    case 'condition':
      return { ...value, condition: sorted(value.condition) };
    case 'exceptions':
      return { ...value, except: value.except.toSorted((a, b) => (a.rule < b.rule ? -1 : 1)) };
    case 'text':
    case 'link':
    case 'detail':
    case 'citation':
    case 'answers':
    case 'expected':
      return value;
  }
}

function sorted(condition: Condition): Condition {
  if (typeof condition === 'boolean') return condition;
  const byText = (parts: readonly Condition[]): readonly Condition[] =>
    parts
      .map((part) => sorted(part))
      .map((part) => ({ part, text: canonicalJson(part) }))
      .sort((a, b) => (a.text < b.text ? -1 : 1))
      .map(({ part }) => part);
  if ('all' in condition) return { all: byText(condition.all) };
  if ('any' in condition) return { any: byText(condition.any) };
  if ('not' in condition) return { not: sorted(condition.not) };
  return 'in' in condition ? { ...condition, in: condition.in.toSorted() } : condition;
}
