import type { RegionKind } from './sheet';

/** How far a place's limits are known: read in their source, from memory and to be confirmed, or none in its line. */
export type LimitsKnown = 'read' | 'to-confirm' | 'none';

export type ListedRegion = {
  readonly code: string;
  readonly name: string;
  readonly kind: RegionKind;
  readonly line: readonly string[];
  readonly edition: number;
  readonly limits: LimitsKnown;
};
