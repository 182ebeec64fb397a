import 'server-only';
import sources from '@/content/notes/fact-sources.json';
import { err, ok, type Result } from '@/lib/kernel/result';
import { citedIn, headingsIn, linkedNotes, termsIn, type Heading, type Note } from './domain/note';
import { numberSources, type NumberedSource } from './domain/note-sources';
import type { WordEntry } from './domain/word';
import { listNotes } from './list-notes';
import { listWords } from './list-words';
import { factSources } from './schema';

export type ReadNote = {
  readonly note: Note;
  readonly headings: readonly Heading[];
  readonly sources: readonly NumberedSource[];
  /** Entries of the word list that the note links to. */
  readonly words: readonly WordEntry[];
  /** Notes that send their readers here. */
  readonly linkedFrom: readonly { readonly slug: string; readonly title: string }[];
};

/** A studio note with its numbered sources and what stands around it. */
export async function readNote(slug: string): Promise<Result<ReadNote, { kind: 'not-found' }>> {
  const notes = await listNotes();
  const note = notes.find((one) => one.slug === slug);
  if (note === undefined) return err({ kind: 'not-found' });
  const facts = new Map(Object.entries(factSources.parse(sources)));
  const used = termsIn(note.body);
  return ok({
    note,
    headings: headingsIn(note.body),
    sources: numberSources(citedIn(note.body), facts),
    words: listWords().filter((word) => used.includes(word.slug)),
    linkedFrom: notes
      .filter((other) => other.slug !== slug && linkedNotes(other.body).includes(slug))
      .map((other) => ({ slug: other.slug, title: other.title })),
  });
}
