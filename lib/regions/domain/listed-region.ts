import { LOCALE } from '@/lib/kernel/words';
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

/** Kinds of places in the order a list shows them. */
export const LISTED_KINDS = ['bloc', 'country', 'part', 'standard'] as const;
export type ListedKind = (typeof LISTED_KINDS)[number];

export type RegionGroup = { readonly kind: ListedKind; readonly regions: readonly ListedRegion[] };

const BY_NAME = new Intl.Collator(LOCALE, { sensitivity: 'base' });

/** Places by kind, each group by name; a kind without places is left out. */
export function groupRegions(regions: readonly ListedRegion[]): readonly RegionGroup[] {
  return LISTED_KINDS.map((kind) => ({
    kind,
    regions: regions.filter((region) => region.kind === kind).sort((a, b) => BY_NAME.compare(a.name, b.name)),
  })).filter((group) => group.regions.length > 0);
}
