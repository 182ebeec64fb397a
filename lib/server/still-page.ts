import 'server-only';
import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import type { ReactElement } from 'react';
import { renderMarkdown } from './markdown';

export type StillPage = 'accessibility' | 'cautions' | 'contact' | 'privacy';

const kept = new Map<StillPage, Promise<ReactElement>>();

/** The text of a page that only changes with the program, from content/pages. Read once. */
export function readStillPage(name: StillPage): Promise<ReactElement> {
  const found = kept.get(name) ?? read(name);
  kept.set(name, found);
  return found;
}

async function read(name: StillPage): Promise<ReactElement> {
  const text = await readFile(join(process.cwd(), 'content', 'pages', `${name}.md`), 'utf8');
  const drawn = renderMarkdown(text);
  if (!drawn.ok) throw new Error(`content/pages/${name}.md cannot be drawn: ${drawn.error.kind}`);
  return drawn.value;
}
