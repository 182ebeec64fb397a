import 'server-only';
import { readdir, readFile } from 'node:fs/promises';
import { join } from 'node:path';

const FOLDER = ['content', 'notes'] as const;
const ENDING = '.mdx';

export type NoteSourceFile = { readonly name: string; readonly text: string };

/** The files of the shipped studio notes, by name without ending. */
export async function readNoteFiles(): Promise<readonly NoteSourceFile[]> {
  const folder = join(process.cwd(), ...FOLDER);
  const names = (await readdir(folder)).filter((name) => name.endsWith(ENDING)).toSorted();
  return Promise.all(
    names.map(async (name) => ({ name: name.slice(0, -ENDING.length), text: await readFile(join(folder, name), 'utf8') })),
  );
}
