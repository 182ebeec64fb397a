import 'server-only';
import { readNoteFiles } from '@/lib/server/note-files';
import { readFrontMatter } from './domain/front-matter';
import type { Note } from './domain/note';
import { noteHead } from './schema';

let kept: Promise<readonly Note[]> | null = null;

/** Every shipped studio note, by title. Read once; a note with a fault stops the reading with its file and its fault. */
export function listNotes(): Promise<readonly Note[]> {
  kept ??= read();
  return kept;
}

async function read(): Promise<readonly Note[]> {
  const notes = (await readNoteFiles()).map(({ name, text }) => noteOf(name, text));
  return notes.toSorted((one, other) => one.title.localeCompare(other.title, 'en'));
}

/** A note out of its file. Throws where the file is no note: shipped content is part of the program. */
export function noteOf(name: string, text: string): Note {
  const file = readFrontMatter(text);
  if (!file.ok) throw new Error(`content/notes/${name}.mdx: ${file.error}`);
  const head = noteHead.safeParse(file.value.fields);
  if (!head.success) {
    const faults = head.error.issues.map(({ path, message }) => `${path.map(String).join('/')}: ${message}`);
    throw new Error(`content/notes/${name}.mdx: ${faults.join('; ')}`);
  }
  if (head.data.slug !== name) throw new Error(`content/notes/${name}.mdx: its slug is "${head.data.slug}"`);
  return { ...head.data, body: file.value.body };
}
