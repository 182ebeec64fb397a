import 'server-only';
import { evaluate } from '@mdx-js/mdx';
import type { Element, Root, RootContent } from 'hast';
import type { MDXContent } from 'mdx/types';
import { Fragment, jsx, jsxs } from 'react/jsx-runtime';
import remarkGfm from 'remark-gfm';
import { headingId } from '@/lib/notes/domain/note';
import { mendTables } from './markdown-tables';
import { elementsIn } from './markdown-tree';

const kept = new Map<string, Promise<MDXContent>>();

/**
 * The body of a shipped note as a component, compiled on the server at its first reading. It takes its building blocks as
 * `components`; no script of it reaches the reader. For shipped content alone: MDX is code.
 */
export function compileNote(body: string): Promise<MDXContent> {
  const made = kept.get(body) ?? compile(body);
  kept.set(body, made);
  return made;
}

async function compile(body: string): Promise<MDXContent> {
  const rehypePlugins = [() => nameHeadings, () => nameTables, () => mendTables, () => headRows, () => glueCitations];
  const { default: content } = await evaluate(body, { Fragment, jsx, jsxs, remarkPlugins: [remarkGfm], rehypePlugins });
  return content;
}

function textOf(node: RootContent): string {
  if (node.type === 'text') return node.value;
  return 'children' in node ? node.children.map(textOf).join('') : '';
}

/** Headings carry the ids that the list of contents leads to. */
function nameHeadings(tree: Root): void {
  for (const element of elementsIn(tree)) if (element.tagName === 'h2') element.properties['id'] = headingId(textOf(element));
}

/** A table inside <Figures caption="…"> takes that caption as its own. */
function nameTables(tree: Root): void {
  for (const node of tree.children) {
    if (node.type !== 'mdxJsxFlowElement' || node.name !== 'Figures') continue;
    const caption = node.attributes.find((one) => one.type === 'mdxJsxAttribute' && one.name === 'caption')?.value;
    const table = node.children.find((child): child is Element => child.type === 'element' && child.tagName === 'table');
    if (typeof caption !== 'string' || table === undefined) continue;
    table.children.unshift({ type: 'element', tagName: 'caption', properties: {}, children: [{ type: 'text', value: caption }] });
  }
}

const isCitation = (node: RootContent | undefined): boolean =>
  node?.type === 'mdxJsxTextElement' && (node.name === 'Fact' || node.name === 'Rule');

/** The number of a source stays on the line of the word it stands behind. */
function glueCitations(tree: Root): void {
  for (const { children } of elementsIn(tree)) {
    for (const [place, child] of children.entries()) {
      if (child.type !== 'text' || child.value.trim() === '' || !isCitation(children[place + 1])) continue;
      child.value = child.value.replace(/\s+$/, '\u00a0');
    }
  }
}

/** The first cell of a row is its header. */
function headRows(tree: Root): void {
  for (const row of elementsIn(tree).filter(({ tagName }) => tagName === 'tr')) {
    const first = row.children.find((child): child is Element => child.type === 'element');
    if (first?.tagName !== 'td') continue;
    first.tagName = 'th';
    first.properties = { ...first.properties, role: 'rowheader', scope: 'row' };
  }
}
