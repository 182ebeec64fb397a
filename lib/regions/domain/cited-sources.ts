import type { Source } from './rule';
import type { ToldSource } from './told-rule';

export type NumberedSource = { readonly number: number; readonly source: Omit<Source, 'id'> };

/** The texts that a list of citations cites, each once, numbered in the order they are met. */
export type CitedSources = {
  readonly list: readonly NumberedSource[];
  readonly numberOf: (cited: ToldSource) => number;
};

const keyOf = ({ title, publisher, identifier = '', url = '', versionDate = '' }: Omit<Source, 'id'>): string =>
  JSON.stringify([title, publisher, identifier, url, versionDate]);

/** Numbers the texts behind some citations. A citation that is not among them has the number 0. */
export function citeSources(cited: readonly ToldSource[]): CitedSources {
  const numbers = new Map<string, NumberedSource>();
  for (const { locator: _, passage: _passage, passageLang: _lang, standing: _standing, evidence: _evidence, ...source } of cited) {
    const key = keyOf(source);
    if (!numbers.has(key)) numbers.set(key, { number: numbers.size + 1, source });
  }
  return { list: [...numbers.values()], numberOf: (source) => numbers.get(keyOf(source))?.number ?? 0 };
}

/** Citations of one text that differ in nothing but their place in it, as one citation of all these places. */
export function alikeTogether(cited: readonly ToldSource[]): readonly ToldSource[] {
  const alike = new Map<string, ToldSource>();
  for (const source of cited) {
    const { locator, passage, standing, evidence } = source;
    const key = JSON.stringify([keyOf(source), standing, evidence, passage ?? null, locator === undefined]);
    const met = alike.get(key);
    if (met === undefined) alike.set(key, source);
    else if (met.locator !== undefined && locator !== undefined) alike.set(key, { ...met, locator: `${met.locator}; ${locator}` });
  }
  return [...alike.values()];
}
