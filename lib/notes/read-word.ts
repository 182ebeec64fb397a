import 'server-only';
import { err, ok, type Result } from '@/lib/kernel/result';
import { plainLines } from './domain/note-text';
import type { WordEntry } from './domain/word';
import { listNotes } from './list-notes';
import { listWords } from './list-words';

export type ReadWord = {
  readonly word: WordEntry;
  readonly see: readonly WordEntry[];
  /** Notes that use the word or one of its synonyms in English. */
  readonly notes: readonly { readonly slug: string; readonly title: string }[];
};

const escaped = (text: string): string => text.replace(/[.*+?^${}()|[\]\\]/g, String.raw`\$&`);

/** An entry of the word list, with related entries and the notes that speak of it. */
export async function readWord(slug: string): Promise<Result<ReadWord, { kind: 'not-found' }>> {
  const all = listWords();
  const word = all.find((one) => one.slug === slug);
  if (word === undefined) return err({ kind: 'not-found' });
  const said = [word.name, ...(word.also['en'] ?? [])].map(escaped).join('|');
  const speaksOf = new RegExp(String.raw`(?<![\p{L}\p{N}])(?:${said})(?![\p{L}\p{N}])`, 'iu');
  const notes = await listNotes();
  return ok({
    word,
    see: all.filter((other) => word.see.includes(other.slug)),
    notes: notes
      .filter(({ title, summary, body }) => speaksOf.test([title, summary, ...plainLines(body)].join('\n')))
      .map((note) => ({ slug: note.slug, title: note.title })),
  });
}
