import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import list from '@/content/words/allowed.json';

const CONTENT = join(import.meta.dirname, '../../../content');
/** Of a region sheet only what we say ourselves: titles and passages of sources are other people's words. */
const OURS = new Set(['title', 'says', 'text', 'name', 'note', 'gaps', 'doNow']);
const NOT_OURS = new Set(['sources', 'facts', 'authorities', 'accreditation', 'lookedIn', 'heard']);

type Said = { readonly where: string; readonly text: string };

function filesIn(folder: string, ending: string): readonly string[] {
  if (!existsSync(folder)) return [];
  return readdirSync(folder, { recursive: true, encoding: 'utf8' })
    .filter((file) => file.endsWith(ending))
    .map((file) => join(folder, file));
}

const isRecord = (value: unknown): value is Readonly<Record<string, unknown>> => typeof value === 'object' && value !== null;

function everyText(value: unknown, where: string): readonly Said[] {
  if (typeof value === 'string') return [{ where, text: value }];
  return isRecord(value) ? Object.entries(value).flatMap(([key, inner]) => everyText(inner, `${where}.${key}`)) : [];
}

function ownTexts(value: unknown, where: string): readonly Said[] {
  if (!isRecord(value)) return [];
  return Object.entries(value).flatMap(([key, inner]) => {
    if (NOT_OURS.has(key)) return [];
    const here = `${where}.${key}`;
    return OURS.has(key) ? everyText(inner, here) : ownTexts(inner, here);
  });
}

const json = (file: string): unknown => JSON.parse(readFileSync(file, 'utf8'));

const SAID: readonly Said[] = [
  ...filesIn(join(CONTENT, 'messages'), '.json').flatMap((file) => everyText(json(file), file)),
  ...filesIn(join(CONTENT, 'pages'), '.md').map((file) => ({ where: file, text: readFileSync(file, 'utf8') })),
  ...['seed', 'heard'].flatMap((name) => filesIn(join(CONTENT, name), '.json')).flatMap((file) => ownTexts(json(file), file)),
];

const inWords = (phrases: readonly string[]): RegExp => new RegExp(`(?<![\\p{L}])(?:${phrases.join('|')})(?![\\p{L}])`, 'giu');

/** The banned words of a text, once the allowed phrases are taken out of it. */
function bannedIn(text: string): readonly string[] {
  return text.replace(/\s+/g, ' ').replace(inWords(list.allowed), '').match(inWords(list.banned)) ?? [];
}

describe('words of verdict', () => {
  test('none stands in our own voice, in messages, pages or sheets', () => {
    const found = SAID.flatMap(({ where, text }) =>
      bannedIn(text).map((word) => `${where.replace(CONTENT, '')}: ${word} in "${text.slice(0, 120)}"`),
    );
    expect(found).toEqual([]);
  });

  test('the scan finds what it is for, and lets the allowed phrases pass', () => {
    expect(bannedIn('This bowl is food-safe and Certified.')).toEqual(['food-safe', 'Certified']);
    expect(bannedIn('No glaze is safe by itself; see the declaration of compliance, product safety, and safe use.')).toEqual([]);
    expect(bannedIn('A glaze is safe')).toEqual(['safe']);
    expect(bannedIn('illegal, unsafely')).toEqual([]);
  });

  test('there is something to scan', () => {
    expect(SAID.length).toBeGreaterThan(100);
  });
});
