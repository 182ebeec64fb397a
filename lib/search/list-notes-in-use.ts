import 'server-only';
import { listNoteEntries } from '@/db/search';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { Ctx } from '@/lib/server/ctx';
import { addressOf } from './domain/entry';

export type ListedNote = {
  readonly slug: string;
  readonly title: string;
  /** The short answer. */
  readonly summary: string;
  readonly synonyms: readonly string[];
  readonly places: readonly string[];
  readonly lookAgainBy: CalendarDate | null;
  readonly address: string;
};

/** Studio notes in use, in the order of their slugs; `next` is the slug to go on after, null at the end. */
export async function listNotesInUse(
  ctx: Ctx,
  { after, limit }: { readonly after: string; readonly limit: number },
): Promise<{ readonly notes: readonly ListedNote[]; readonly next: string | null }> {
  const rows = await listNoteEntries(ctx.db, after, limit + 1);
  const notes = rows.slice(0, limit).map(({ text, also, title, slug, places, lookAgainBy, kind, region }) => {
    const [summary = ''] = text.split('\n');
    return { slug, title, summary, synonyms: also, places, lookAgainBy, address: addressOf({ kind, region, slug }) };
  });
  return { notes, next: rows.length > limit ? (notes.at(-1)?.slug ?? null) : null };
}
