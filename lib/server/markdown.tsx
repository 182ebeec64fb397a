import 'server-only';
import type { Root } from 'hast';
import { toJsxRuntime } from 'hast-util-to-jsx-runtime';
import type { ComponentProps, ReactElement } from 'react';
import { Fragment, jsx, jsxs } from 'react/jsx-runtime';
import rehypeSanitize, { defaultSchema, type Options } from 'rehype-sanitize';
import remarkGfm from 'remark-gfm';
import remarkParse from 'remark-parse';
import remarkRehype from 'remark-rehype';
import { unified } from 'unified';
import { err, ok, type Result } from '@/lib/kernel/result';
import { words } from '@/lib/kernel/words';
import { log } from './log';
import { mendTables } from './markdown-tables';
import { elementsIn } from './markdown-tree';

const LARGEST_BYTES = 50_000;
/** Pictures would be fetched from elsewhere, and boxes to tick would be controls that do nothing. */
const LEFT_OUT = ['img', 'picture', 'source', 'input'];

const SCHEMA: Options = {
  ...defaultSchema,
  tagNames: (defaultSchema.tagNames ?? []).filter((name) => !LEFT_OUT.includes(name)),
  protocols: { ...defaultSchema.protocols, href: ['http', 'https', 'mailto'] },
};

export type MarkdownRefusal = { readonly kind: 'too-long' } | { readonly kind: 'too-tangled' };

/**
 * Markdown as React elements: no raw HTML, no pictures, links only to http, https, mailto and this site.
 * Headings begin at h2 and skip no level, so that the page's own h1 stays the only one.
 */
export function renderMarkdown(source: string): Result<ReactElement, MarkdownRefusal> {
  if (Buffer.byteLength(source) > LARGEST_BYTES) return err({ kind: 'too-long' });
  if (isTangled(source)) return err({ kind: 'too-tangled' });
  try {
    return ok(toJsxRuntime(treeOf(source), { Fragment, jsx, jsxs, components: { table: ScrollingTable } }));
  } catch (error) {
    // A depth that none of the bounds foresaw ends in a call stack that is too deep; nothing else here throws.
    if (!(error instanceof RangeError)) throw error;
    log.warn({ refused: 'markdown', bytes: Buffer.byteLength(source) });
    return err({ kind: 'too-tangled' });
  }
}

/** What a line may open at its start, quotes and lists in each other, before it is no text any more. */
const DEEPEST_LINE = 24;
const OPENERS = /^(?:[ \t]*(?:>|[-+*](?=[ \t])|\d{1,9}[.)](?=[ \t])))+/gm;
const FAR_IN = /^[ \t]{80}/m;

/** How much of this a text may hold: many times what people write, and little enough that parsing it is quick. */
const MOST: readonly (readonly [what: RegExp, times: number])[] = [
  [/\n|\r/g, 600],
  [/[[\]()`*_~<>&\\|#!:@]/g, 2000],
  // A heading by the line under it: each one looks through all that came before.
  [/^[ \t>]{0,12}(?:=+|-+)[ \t]*$/gm, 40],
];

const hasTooMany = (source: string): boolean => MOST.some(([what, times]) => (source.match(what) ?? []).length > times);

/** Asked before parsing, whose time grows with the square of such a depth: 50 kB of ">" would take minutes. */
function isTangled(source: string): boolean {
  if (FAR_IN.test(source) || hasTooMany(source)) return true;
  return (source.match(OPENERS) ?? []).some((openers) => openers.replace(/[\s\d]+/g, '').length > DEEPEST_LINE);
}

const processor = unified()
  .use(remarkParse)
  .use(remarkGfm)
  // The prefix for ids is put on once, by the sanitiser.
  .use(remarkRehype, { clobberPrefix: '' })
  .use(() => sayTasks)
  .use(rehypeSanitize, SCHEMA)
  .use(() => mendLinks)
  .use(() => mendHeadings)
  .use(() => mendTables);

const treeOf = (source: string): Root => processor.runSync(processor.parse(source));

/** A box of a task list becomes the word for it. */
function sayTasks(tree: Root): void {
  for (const element of elementsIn(tree)) {
    element.children = element.children.map((child) =>
      child.type === 'element' && child.tagName === 'input'
        ? { type: 'text', value: words(child.properties['checked'] === true ? 'site.markdown.done' : 'site.markdown.open') }
        : child,
    );
  }
}

const SAME_SITE = /^\/(?![/\\])/;
const ELSEWHERE = /^https?:\/\//i;

/** Footnotes find their ids again; a link that leads nowhere we allow stays as its words; other sites get no credit from us. */
function mendLinks(tree: Root): void {
  for (const element of elementsIn(tree)) {
    const href = element.tagName === 'a' ? element.properties['href'] : undefined;
    if (typeof href !== 'string') continue;
    if (href.startsWith('#')) element.properties['href'] = `#user-content-${href.slice(1)}`;
    else if (ELSEWHERE.test(href)) element.properties['rel'] = ['nofollow', 'ugc', 'noopener'];
    else if (!SAME_SITE.test(href) && !href.toLowerCase().startsWith('mailto:')) delete element.properties['href'];
  }
}

/** Levels as they lie in each other, whatever numbers the writer chose: h2 at the top, no level skipped, h6 at most. */
function mendHeadings(tree: Root): void {
  const above: number[] = [];
  for (const element of elementsIn(tree)) {
    const level = /^h([1-6])$/.exec(element.tagName)?.[1];
    if (level === undefined) continue;
    const depth = Number(level);
    while ((above.at(-1) ?? 0) >= depth) above.pop();
    above.push(depth);
    element.tagName = `h${String(Math.min(above.length + 1, 6))}`;
  }
}

/** A wide table scrolls in its own frame, which the keyboard can reach. */
function ScrollingTable(table: ComponentProps<'table'>): ReactElement {
  return (
    <div className="scroll-area" role="region" aria-label={words('site.markdown.table')} tabIndex={0}>
      <table {...table} />
    </div>
  );
}
