import { canonicalJson } from '@/lib/kernel/canonical-json';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { DraftEntry } from './amendment-view';

type Values = DraftEntry['values'];

/** What stands there by now; `values` is null where it was saved or dropped meanwhile. */
export type EntryMovedOn = { readonly kind: 'entry-moved-on'; readonly values: Values | null; readonly version: number };

export const isAlike = (a: Values, b: Values): boolean => canonicalJson(a) === canonicalJson(b);

/** REG-57 Whether what was typed over `version` may take the place of what stands: no text is overwritten unseen. */
export function followedBy(entry: DraftEntry | null, version: number): Result<null, EntryMovedOn> {
  const standing = entry?.version ?? 0;
  return standing === version ? ok(null) : err({ kind: 'entry-moved-on', values: entry?.values ?? null, version: standing });
}

const ROOM = 10_000;

/** An entry begun anew never counts over what an earlier one of the item counted: a tab left open would take it for its own. */
export const nextVersion = (entry: DraftEntry | null, amendment: number): number => (entry === null ? amendment * ROOM : entry.version) + 1;
