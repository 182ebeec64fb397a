import type { Fraction } from '@/lib/kernel/fraction';

export const PARTS = ['vessel', 'lid', 'rim', 'content'] as const;
/** What of a piece was tested: what came out of vessel, lid or rim, or what the piece holds in all. */
export type Part = (typeof PARTS)[number];

/** One figure of a lab report. `below` means that the lab saw nothing down to this value: anything from zero up to it is possible. */
export type Reading = {
  readonly specimen: string;
  readonly part: Part;
  readonly substance: string;
  readonly value: Fraction;
  readonly unit: string;
  readonly below: boolean;
};

/** The acid a part was filled with, or lay in, and the face it touched. Null where nobody noted it. */
export type Extract = { readonly part: Part; readonly volumeMl: Fraction | null; readonly areaCm2: Fraction | null };

/** How the test was run, as far as it is told. */
export type Conditions = {
  readonly temperatureC?: number | undefined;
  readonly hours?: number | undefined;
  readonly dark?: boolean | undefined;
  readonly hot?: boolean | undefined;
};

/** A lab's figures for one combination of clay, form, texture, glaze and firing. */
export type Report = {
  readonly readings: readonly Reading[];
  /** Of pieces tested after the first ones. */
  readonly furtherPieces: readonly Reading[];
  /** At most one for a part. */
  readonly extracts: readonly Extract[];
  readonly conditions: Conditions;
};
