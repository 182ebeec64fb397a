import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { Fragment, isValidElement, type ReactNode } from 'react';
import { renderToStaticMarkup } from 'react-dom/server';
import ts from 'typescript';
import { describe, expect, test } from 'vitest';
import { renderMarkdown } from '@/lib/server/markdown';
import { cpuOf, HOSTILE, LONG } from '../../builders/hostile-text';

const ROOT = join(import.meta.dirname, '../../..');

/** All that Markdown may become. Written here anew, not read from what is tried. */
const ELEMENTS = new Set(
  [
    ...['a', 'blockquote', 'br', 'code', 'del', 'div', 'em', 'h2', 'h3', 'h4', 'h5', 'h6', 'hr', 'li', 'ol', 'p', 'pre', 'section'],
    ...['span', 'strong', 'sup', 'table', 'tbody', 'td', 'th', 'thead', 'tr', 'ul'],
  ].values(),
);
const ATTRIBUTES =
  /^(?:href|rel|title|id|className|role|scope|start|tabIndex|children|align|aria-[a-z]+|data-footnote-?[a-z]+|dataFootnote[A-Za-z]+|dir)$/;
const LEADS_TO = new Set(['http:', 'https:', 'mailto:']);

/** What stands in a drawn tree that may not. */
function faultsIn(node: ReactNode): readonly string[] {
  if (Array.isArray(node)) return node.flatMap((child: ReactNode) => faultsIn(child));
  if (!isValidElement<Record<string, unknown>>(node)) return [];
  const { type, props } = node;
  if (typeof type === 'function') return faultsIn((type as (given: unknown) => ReactNode)(props));
  const inside = faultsIn(props['children'] as ReactNode);
  if (typeof type !== 'string') return type === Fragment ? inside : ['no element', ...inside];
  const odd = Object.keys(props).filter((name) => !ATTRIBUTES.test(name));
  const href = props['href'];
  const isAway = href !== undefined && !(typeof href === 'string' && LEADS_TO.has(new URL(href, 'https://footring.example.test').protocol));
  return [
    ...(ELEMENTS.has(type) ? [] : [`<${type}>`]),
    ...odd.map((name) => `<${type} ${name}>`),
    ...(isAway ? [`href=${JSON.stringify(href)}`] : []),
    ...inside,
  ];
}

/** Where a payload can stand in a text. */
const PLACES: readonly (readonly [name: string, within: (text: string) => string])[] = [
  ['alone', (text) => text],
  ['in a sentence', (text) => `Fire to cone 6 ${text} slowly.`],
  ['in a list', (text) => `- ${text}\n- b`],
  ['in a quote', (text) => `> ${text}`],
  ['in a heading', (text) => `## ${text}`],
  ['in a table', (text) => `| a | b |\n|---|---|\n| ${text} | c |`],
  ['as the words of a link', (text) => `[${text}](/regions)`],
  ['as the address of a link', (text) => `[x](${text})`],
  ['as a bracketed address', (text) => `[x](<${text}>)`],
  ['as the title of a link', (text) => `[x](/regions "${text}")`],
  ['as the words for a picture', (text) => `![${text}](x.png)`],
  ['as a reference', (text) => `[x][r]\n\n[r]: ${text}`],
  ['as a footnote', (text) => `a[^1]\n\n[^1]: ${text}`],
  ['as the name of a footnote', (text) => `a[^${text}]\n\n[^${text}]: b`],
  ['in code', (text) => `\`${text}\``],
  ['in a block of code', (text) => `\`\`\`${text}\n${text}\n\`\`\``],
  ['in emphasis', (text) => `**${text}**`],
  ['in an angle', (text) => `<${text}>`],
];

describe('REG-93 S33 a hostile text in Markdown', () => {
  test('there are at least 150 of them, each once', () => {
    expect(new Set(HOSTILE.map(({ text }) => text)).size).toBe(HOSTILE.length);
    expect(HOSTILE.length).toBeGreaterThanOrEqual(150);
  });

  test.each(PLACES)('%s becomes no element, attribute or address outside the list', (_, within) => {
    for (const { text } of HOSTILE) {
      const drawn = renderMarkdown(within(text));
      if (!drawn.ok) continue;
      expect([text, faultsIn(drawn.value)]).toEqual([text, []]);
      const html = renderToStaticMarkup(drawn.value);
      const tags = [...html.matchAll(/<\/?([a-z][^\s/>]*)/gi)].map(([, tag = '']) => tag.toLowerCase());
      expect([text, tags.filter((tag) => !ELEMENTS.has(tag))]).toEqual([text, []]);
    }
  });

  test('the walk over a drawn tree finds what it is to find', () => {
    const bad = (
      <p>
        <a href="javascript:x">x</a>
        <video src="x" />
        <b onClick={() => undefined}>x</b>
      </p>
    );
    expect(faultsIn(bad)).toEqual(['href="javascript:x"', '<video>', '<video src>', '<b>', '<b onClick>']);
  });

  test('S34 what looks like a template, an expression or a module stands there as it was typed', () => {
    const typed = ['{process.env.X}', '${7*7}', '{{7*7}}', '<%= 7*7 %>', '#{7*7}', 'export const a = 7*7', 'import x from "y"', '{7*7}'];
    for (const text of typed) {
      const drawn = renderMarkdown(text);
      const html = drawn.ok ? renderToStaticMarkup(drawn.value) : '';
      const shown = html
        .replace(/<[^>]*>/g, '')
        .replaceAll('&lt;', '<')
        .replaceAll('&gt;', '>')
        .replaceAll('&quot;', '"');
      expect(shown).toBe(text);
    }
  });
});

describe('code that makes code', () => {
  type Source = { readonly file: string; readonly text: string };
  const sources: readonly Source[] = ['app', 'components', 'content', 'db', 'lib', 'scripts']
    .flatMap((folder) => readdirSync(join(ROOT, folder), { recursive: true, encoding: 'utf8' }).map((name) => join(folder, name)))
    .filter((file) => /\.(?:ts|tsx|mjs)$/.test(file))
    .map((file) => ({ file, text: readFileSync(join(ROOT, file), 'utf8') }));

  /** Whether a source calls, makes or imports something of these names. */
  function uses({ file, text }: Source, names: RegExp, modules: RegExp): boolean {
    if (!names.test(text) && !modules.test(text)) return false;
    const look = (node: ts.Node): boolean => {
      const called = (ts.isCallExpression(node) || ts.isNewExpression(node)) && names.test(node.expression.getText());
      const from = (ts.isImportDeclaration(node) || ts.isExportDeclaration(node)) && node.moduleSpecifier?.getText();
      return called || (typeof from === 'string' && modules.test(from)) || (ts.forEachChild(node, look) ?? false);
    };
    return look(ts.createSourceFile(file, text, ts.ScriptTarget.Latest, true));
  }
  const users = (names: RegExp, modules: RegExp): readonly string[] =>
    sources.filter((source) => uses(source, names, modules)).map(({ file }) => file);

  test('REG-94 S34 is used for shipped notes alone, whose page reads them from files', () => {
    expect(users(/^(?:eval|Function|globalThis\.eval|compile|compileSync|evaluate|evaluateSync|runSync)$/, /@mdx-js|next-mdx/)).toEqual([
      'lib/server/note-body.ts',
    ]);
    expect(users(/^runIn(?:New|This)?Context$/, /['"](?:node:)?vm['"]/)).toEqual(['scripts/bench/own.ts']);
    expect(users(/^compileNote$/, /server\/note-body/)).toEqual(['app/(public)/notes/[slug]/page.tsx']);
    const page = sources.find(({ file }) => file === 'app/(public)/notes/[slug]/page.tsx')?.text ?? '';
    expect([...page.matchAll(/compileNote\(([^)]*)\)/g)].map(([, given]) => given)).toEqual(['note.body']);
    const reader = sources.find(({ file }) => file === 'lib/notes/read-note.ts')?.text ?? '';
    expect([reader.includes('@/db/amend'), reader.includes('@/db/doubts')]).toEqual([false, false]);
  });

  test('S35 no text is set as HTML, and no script of data stands in a page', () => {
    const ofUs = sources.filter(({ file }) => !file.startsWith('scripts'));
    expect(ofUs.filter(({ text }) => /dangerouslySetInnerHTML|\binnerHTML\b|insertAdjacentHTML|document\.write/.test(text))).toEqual([]);
    const drawing = ofUs.filter(({ file }) => file.endsWith('.tsx'));
    expect(drawing.filter(({ text }) => /ld\+json|<script\b/i.test(text)).map(({ file }) => file)).toEqual([]);
  });
});

describe('S37 fifty thousand characters of a kind', () => {
  test('as Markdown are drawn or refused without hanging', () => {
    renderMarkdown('# The first one reads the code');
    const took = Object.entries(LONG).flatMap(([name, text]) =>
      [50_000, 4_000, 1_900].map((length) => [name, cpuOf(() => void renderMarkdown(text.slice(0, length)))] as const),
    );
    const slowest = took.toSorted(([, a], [, b]) => b - a).slice(0, 5);
    process.stdout.write(`Markdown, ms of processor time: ${slowest.map(([name, ms]) => `${name} ${ms.toFixed(0)}`).join(', ')}\n`);
    expect(took.filter(([, ms]) => ms > 2000)).toEqual([]);
  });
});
