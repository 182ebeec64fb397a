import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { noteOf } from '@/lib/notes/list-notes';

const folder = path.resolve('content/notes');

/** Every shipped note, straight from its file. */
export const SHIPPED = readdirSync(folder)
  .filter((name) => name.endsWith('.mdx'))
  .map((name) => noteOf(name.replace(/\.mdx$/, ''), readFileSync(path.join(folder, name), 'utf8')));
