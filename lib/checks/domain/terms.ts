import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { err, ok, type Result } from '@/lib/kernel/result';
import { isInForce } from '@/lib/regions/domain/rule';
import { readCondition, type Reading, type Scope } from './condition-reading';
import type { CompileFault, EngineTerm, Layer } from './line-input';

/** A term in force, read in its own layer. */
export type ReadTerm = { readonly id: string; readonly layer: number; readonly reading: Reading };

export type Terms = {
  readonly list: readonly ReadTerm[];
  /** Positions in `list`, every term after those it uses. */
  readonly inOrder: readonly number[];
};

/** The terms in force on a day, and where a term's id leads from a layer. */
export type TermNames = {
  readonly inForce: readonly { readonly term: EngineTerm; readonly layer: number }[];
  readonly termOf: (id: string, layer: number) => number | null;
};

/** Which version of each term is in force. A name is looked up in the layer it stands in, then from local to general. */
export function namesOfTerms(layers: readonly Layer[], on: CalendarDate): TermNames {
  const byLayer = layers.map(({ terms }) => versionsInForce(terms, on));
  const inForce = byLayer.flatMap((terms, layer) => terms.map((term) => ({ term, layer })));
  const placeOf = new Map(inForce.map(({ term, layer }, at) => [`${layer} ${term.id}`, at]));
  const localFirst = layers.map((_, layer) => layer).reverse();
  const termOf = (id: string, layer: number): number | null => {
    const home = [layer, ...localFirst].find((candidate) => placeOf.has(`${candidate} ${id}`));
    return home === undefined ? null : (placeOf.get(`${home} ${id}`) ?? null);
  };
  return { inForce, termOf };
}

/** One version a term, by id. Should two be in force, the one that began last counts. */
function versionsInForce(terms: readonly EngineTerm[], on: CalendarDate): readonly EngineTerm[] {
  const sorted = terms.filter((term) => isInForce(term, on)).sort((a, b) => (ageKey(a) < ageKey(b) ? -1 : 1));
  return [...new Map(sorted.map((term) => [term.id, term])).values()];
}

const ageKey = ({ id, from, to }: EngineTerm): string => [id, from ?? '', to ?? ''].join(' ');

/** Reads every term in force and orders them, or names the first that is at fault. */
export function readTerms(names: TermNames, scope: Omit<Scope, 'termOf'>): Result<Terms, CompileFault> {
  const list: ReadTerm[] = [];
  for (const { term, layer } of names.inForce) {
    const reading = readCondition(term.when, { ...scope, termOf: (id) => names.termOf(id, layer) });
    if (!reading.ok) return err({ ...reading.error, in: term.id });
    list.push({ id: term.id, layer, reading: reading.value });
  }
  const uses = list.map(({ reading }) => termsIn(reading));
  const inOrder = orderByUse(uses);
  if (inOrder.length === list.length) return ok({ list, inOrder });
  return err({ kind: 'term-cycle', in: list[onCycle(uses, new Set(inOrder))]?.id ?? '' });
}

function termsIn(reading: Reading): readonly number[] {
  switch (reading.kind) {
    case 'term':
      return [reading.term];
    case 'not':
      return termsIn(reading.part);
    case 'all':
    case 'any':
      return reading.parts.flatMap(termsIn);
    case 'always':
    case 'test':
      return [];
  }
}

/** Positions such that all a term uses stands before it. Terms on or above a cycle are left out. */
function orderByUse(uses: readonly (readonly number[])[]): readonly number[] {
  const waitingFor = uses.map((used) => new Set(used).size);
  const usedBy = uses.map((): number[] => []);
  uses.forEach((used, at) => {
    for (const term of new Set(used)) usedBy[term]?.push(at);
  });
  const inOrder = waitingFor.flatMap((count, at) => (count === 0 ? at : []));
  for (const done of inOrder) {
    for (const user of usedBy[done] ?? []) {
      const left = (waitingFor[user] ?? 0) - 1;
      waitingFor[user] = left;
      if (left === 0) inOrder.push(user);
    }
  }
  return inOrder;
}

/** A term that uses itself by way of others: following uses among those left out must come round. */
function onCycle(uses: readonly (readonly number[])[], done: ReadonlySet<number>): number {
  const seen = new Set<number>();
  let at = uses.findIndex((_, term) => !done.has(term));
  while (!seen.has(at)) {
    seen.add(at);
    at = uses[at]?.find((term) => !done.has(term)) ?? at;
  }
  return at;
}
