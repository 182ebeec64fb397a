import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { Strength } from '@/lib/regions/domain/rule';

export const SEARCH_KINDS = ['note', 'word', 'region', 'term', 'rule', 'source'] as const;
export type SearchKind = (typeof SEARCH_KINDS)[number];

export const isSearchKind = (value: unknown): value is SearchKind => SEARCH_KINDS.some((kind) => kind === value);

/** Something a reader can find: what it is called, what else it is called, and its text without marks of layout. */
export type SearchEntry = {
  readonly kind: SearchKind;
  /** Code of the sheet it stands in; empty for what belongs to no place. */
  readonly region: string;
  /** Key within its kind and region: a rule's id, a note's slug, a region's code. */
  readonly slug: string;
  readonly edition: number;
  readonly title: string;
  readonly also: readonly string[];
  readonly text: string;
  /** Of a rule. */
  readonly strength: Strength | null;
  readonly from: CalendarDate | null;
  readonly to: CalendarDate | null;
  readonly lookAgainBy: CalendarDate | null;
  /** Places a note speaks of. */
  readonly places: readonly string[];
};

/** What ranking needs to know of an entry; `score` is how well the database found it. */
export type Candidate = Omit<SearchEntry, 'text'> & { readonly score: number };

/** The page an entry stands on. */
export function addressOf({ kind, region, slug }: Pick<SearchEntry, 'kind' | 'region' | 'slug'>): string {
  switch (kind) {
    case 'note':
      return `/notes/${slug}`;
    case 'word':
      return `/words/${slug}`;
    case 'region':
      return `/regions/${slug}`;
    case 'term':
      return `/terms/${slug}`;
    case 'rule':
      return `/rules/${slug}`;
    case 'source':
      return `/sources/${region}--${slug}`;
  }
}
