import type { SheetNames } from './sheet-names';

export type RuleChoice = { readonly id: string; readonly title: string; readonly says: string; readonly region: string };
export type TermChoice = { readonly id: string; readonly name: string; readonly category: boolean; readonly region: string };
export type PlaceChoice = { readonly code: string; readonly name: string; readonly hasSheet: boolean };

/** What the forms of a proposed sheet choose from, of its own and of the layers above, general to local. */
export type FormGround = {
  readonly rules: readonly RuleChoice[];
  readonly terms: readonly TermChoice[];
  readonly places: readonly PlaceChoice[];
};

/** Names for the sentences of conditions. */
export const namesIn = ({ terms, places }: FormGround): SheetNames => ({
  terms: new Map(terms.map(({ id, name, region, category }) => [id, { name, region, category }])),
  regions: new Map(places.map(({ code, name }) => [code, name])),
});
