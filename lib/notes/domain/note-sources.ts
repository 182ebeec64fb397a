import type { Cited } from './note';

/** A text that a fact was taken from, and how well we know it. */
export type FactSource = {
  readonly title: string;
  readonly publisher: string;
  readonly identifier?: string | undefined;
  readonly locator?: string | undefined;
  readonly url?: string | undefined;
  readonly versionDate?: string | undefined;
};

export type FactEvidence = 'read' | 'memory' | 'common-practice';

/** A cited fact: its source, whether it was read, and whether the copy or the reading is weak. */
export type NoteFact = { readonly source: FactSource; readonly evidence: FactEvidence; readonly weak: boolean };

/** One line of a note's list of sources, with every fact or rule whose citation leads to it. */
export type NumberedSource = { readonly number: number; readonly ids: readonly string[] } & (
  { readonly kind: 'text'; readonly fact: NoteFact } | { readonly kind: 'rule' }
);

/**
 * Numbers the citations of a note in their order. Facts taken from one place of one text share its number.
 * A cited fact that is not known is left out; a test asks that there is none.
 */
export function numberSources(cited: readonly Cited[], facts: ReadonlyMap<string, NoteFact>): readonly NumberedSource[] {
  const groups = new Map<string, { readonly fact: NoteFact | null; readonly ids: string[] }>();
  for (const { kind, id } of cited) {
    const fact = kind === 'fact' ? facts.get(id) : null;
    if (fact === undefined) continue;
    const key = fact === null ? `rule ${id}` : JSON.stringify(fact);
    const group = groups.get(key);
    if (group === undefined) groups.set(key, { fact, ids: [id] });
    else group.ids.push(id);
  }
  return [...groups.values()].map(({ fact, ids }, place) =>
    fact === null ? { number: place + 1, ids, kind: 'rule' } : { number: place + 1, ids, kind: 'text', fact },
  );
}
