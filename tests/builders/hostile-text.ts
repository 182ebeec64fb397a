import { readFileSync } from 'node:fs';
import { z } from 'zod';

/** Texts that try to become code somewhere: `__fired++` would tell. */
export const HOSTILE: readonly { readonly kind: string; readonly text: string }[] = z
  .array(z.strictObject({ kind: z.string(), text: z.string() }))
  .parse(JSON.parse(readFileSync(new URL('../fixtures/hostile-text.json', import.meta.url), 'utf8')));

/** Worst cases of 50 kB for whatever looks for patterns in a text. */
export const LONG: Readonly<Record<string, string>> = Object.fromEntries(
  Object.entries({
    letters: 'a',
    blanks: ' ',
    tabs: '\t',
    'line ends': '\n',
    'round brackets': '(',
    'square brackets': '[',
    'links begun': '[a](',
    'pictures begun': '![a](',
    'references begun': '[a][',
    'curly brackets': '{{',
    asterisks: '*',
    'asterisks and letters': '*a ',
    'nested emphasis': '*a **a ',
    underscores: '_a',
    backticks: '`',
    'backticks and letters': '`a',
    tildes: '~~a',
    'angle brackets': '<',
    'tags begun': '<a ',
    'tags with attributes': '<a b=c ',
    'comments begun': '<!-- ',
    'cdata begun': '<![CDATA[',
    addresses: 'http://a.b/',
    'addresses begun': 'http://',
    'www begun': 'www.',
    mails: 'a@b.c ',
    'mails begun': 'a@',
    entities: '&amp;',
    'entities begun': '&',
    backslashes: '\\',
    tables: '|a',
    'table rules': '|-',
    headings: '# a\n',
    'underlined headings': 'a\n=\n',
    lists: '- a\n',
    footnotes: '[^a]',
    'footnotes begun': '[^',
    definitions: '[a]: b\n',
    digits: '1',
    'digits and dots': '1.',
    hyphens: '-',
    commas: ',',
    accents: 'a\u0301',
    'accents alone': '\u0301',
    ligatures: '\ufdfa',
    'zero-width': '\u200b',
    'turned direction': '\u202e',
    'halves of pairs': '\ud800',
    kilns: '🏺',
    'blanks and a letter': `${' '.repeat(500)}a`,
    'letters and a mark': `${'a'.repeat(500)}!`,
    'upper and lower': 'aA',
    'carriage returns': '\r',
    mixed: '*[`<_~(',
  }).map(([name, part]) => [name, part.repeat(Math.ceil(50_000 / part.length)).slice(0, 50_000)]),
);

/** Milliseconds of processor time that some work took. */
export function cpuOf(work: () => void): number {
  const before = process.cpuUsage();
  work();
  const { user, system } = process.cpuUsage(before);
  return (user + system) / 1000;
}
