import type { ReactElement } from 'react';
import type { Trace } from '@/lib/checks/domain/trace';
import { NO, UNKNOWN, YES } from '@/lib/kernel/tri';
import { words } from '@/lib/kernel/words';
import { sayCondition, type SaidCondition } from '@/lib/regions/domain/condition-words';
import type { SheetNames } from '@/lib/regions/domain/sheet-names';

/** One fact that decides, with what it rests on itself. */
type Told = { readonly text: string; readonly parts: readonly Told[] };
type Leaf = Extract<Trace, { readonly kind: 'leaf' }>;
type Term = Extract<Trace, { readonly kind: 'term' }>;
type Joined = Extract<Trace, { readonly kind: 'all' | 'any' | 'not' }>;

/** What decides a condition, as a list of facts: what holds, what does not, what is not known yet. */
export function TraceList({ trace, names }: { readonly trace: Trace; readonly names: SheetNames }): ReactElement {
  const told = tell(trace, names);
  if (told.length === 0) return <p>{words(trace.value === NO ? 'checks.why.never' : 'checks.why.always')}</p>;
  return <ToldList told={told} />;
}

function ToldList({ told }: { readonly told: readonly Told[] }): ReactElement {
  return (
    <ul className="list-disc ps-6">
      {told.map(({ text, parts }, place) => (
        <li key={place}>
          {text}
          {parts.length === 0 ? null : <ToldList told={parts} />}
        </li>
      ))}
    </ul>
  );
}

/** A decided part is so because of every fact below it, so that lists within lists are told as one. The same fact is told once. */
function tell(trace: Trace, names: SheetNames): readonly Told[] {
  switch (trace.kind) {
    case 'always':
      return [];
    case 'leaf':
      return tellLeaf(trace, names);
    case 'term':
      return [tellTerm(trace, names)];
    case 'all':
    case 'any':
    case 'not':
      return tellJoined(trace, names);
  }
}

function tellLeaf({ value, leaf, gate }: Leaf, names: SheetNames): readonly Told[] {
  const before = gate === null || gate.value === YES ? [] : tell(gate, names);
  if (gate?.value === NO) return before;
  return [...before, { text: factWords(leaf, value, names), parts: [] }];
}

/** What does not hold is said by its opposite where there is one: "at most 25 mm" for not more. */
function factWords(leaf: Leaf['leaf'], value: Trace['value'], names: SheetNames): string {
  const plain = lineOf(sayCondition(leaf, names));
  if (value === YES) return plain;
  if (value === UNKNOWN) return words('checks.why.unknown', { said: plain });
  const opposite = sayCondition({ not: leaf }, names);
  return opposite.kind === 'line' ? opposite.text : words('checks.why.not', { said: plain });
}

const lineOf = (said: SaidCondition): string => (said.kind === 'line' ? said.text : '');

function tellTerm({ id, value, why }: Term, names: SheetNames): Told {
  const name = names.terms.get(id)?.name ?? id;
  const counts = words('regions.condition.term', { name });
  const unknown = value === UNKNOWN ? words('checks.why.unknown', { said: counts }) : counts;
  const text = value === NO ? words('checks.why.termNot', { name }) : unknown;
  return { text, parts: why === null ? [] : tell(why, names) };
}

function tellJoined({ kind, value, parts }: Joined, names: SheetNames): readonly Told[] {
  const told = once(parts.flatMap((part) => tell(part, names)));
  const isTogether = kind !== 'not' && value !== UNKNOWN && parts.some((part) => part.value === UNKNOWN);
  if (!isTogether) return told;
  return [{ text: words(kind === 'any' ? 'checks.why.either' : 'checks.why.neither'), parts: told }];
}

const once = (told: readonly Told[]): readonly Told[] => [...new Map(told.map((one) => [one.text, one])).values()];
