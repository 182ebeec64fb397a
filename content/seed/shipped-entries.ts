import { z } from 'zod';
import { readFrontMatter } from '@/lib/notes/domain/front-matter';
import { plainText } from '@/lib/notes/domain/note-text';
import { noteHead, wordEntries } from '@/lib/notes/schema';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { SearchEntry } from '@/lib/search/domain/entry';
import type { SeedFaults } from './sheet-file';

/** No edition: it comes with the program. */
const SHIPPED = 0;
const BARE = { region: '', edition: SHIPPED, strength: null, from: null, to: null, lookAgainBy: null, places: [] } as const;

/** What a reader finds of a shipped note: its short answer and its text. Or what is wrong with the file. */
export function noteEntry(file: string, text: string): Result<SearchEntry, SeedFaults> {
  const parts = readFrontMatter(text);
  if (!parts.ok) return err([`${file}: ${parts.error}`]);
  const head = noteHead.safeParse(parts.value.fields);
  if (!head.success) return err([`${file}: ${z.prettifyError(head.error)}`]);
  const { title, slug, summary, synonyms, places, lookAgainBy } = head.data;
  const body = `${summary}\n${plainText(parts.value.body)}`;
  return ok({ ...BARE, kind: 'note', slug, title, also: synonyms, text: body, places, lookAgainBy });
}

/** What a reader finds of the word list. Or what is wrong with its file. */
export function wordListEntries(file: string, text: string): Result<readonly SearchEntry[], SeedFaults> {
  const entries = wordEntries.safeParse(JSON.parse(text));
  if (!entries.success) return err([`${file}: ${z.prettifyError(entries.error)}`]);
  return ok(
    entries.data.map(({ slug, name, definition, also }) => ({
      ...BARE,
      kind: 'word',
      slug,
      title: name,
      also: Object.values(also).flat(),
      text: definition,
    })),
  );
}
