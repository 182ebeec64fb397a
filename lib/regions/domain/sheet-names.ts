import type { SheetLayer } from './told-sheet';

/** Names a rule's text refers to: terms and places by their ids. A term's home is where its definition can be read. */
export type SheetNames = {
  readonly terms: ReadonlyMap<string, { readonly name: string; readonly region: string; readonly category: boolean }>;
  readonly regions: ReadonlyMap<string, string>;
};

type Layer = Pick<SheetLayer, 'code' | 'name' | 'terms'>;

/** The names of a line, from its layers. */
export function namesOf(layers: readonly Layer[]): SheetNames {
  const terms = layers.flatMap((layer) =>
    layer.terms.map(({ id, name, category }) => [id, { name, region: layer.code, category }] as const),
  );
  return { terms: new Map(terms), regions: new Map(layers.map(({ code, name }) => [code, name])) };
}
