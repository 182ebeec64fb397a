import type { Element, ElementContent, Root } from 'hast';
import { elementsIn } from './markdown-tree';

/** Said where they are not needed, since a table drawn as blocks loses them in some browsers. */
const ROLES: Readonly<Record<string, string>> = {
  table: 'table',
  thead: 'rowgroup',
  tbody: 'rowgroup',
  tr: 'row',
  th: 'columnheader',
  td: 'cell',
};

const textOf = (node: ElementContent): string => {
  if (node.type === 'text') return node.value;
  return node.type === 'element' ? node.children.map(textOf).join('') : '';
};

const cellsOf = (row: Element): readonly Element[] =>
  row.children.filter((child): child is Element => child.type === 'element' && (child.tagName === 'td' || child.tagName === 'th'));

/** For the eye only: in a narrow window each cell carries its column's name. */
const label = (name: string): Element => ({
  type: 'element',
  tagName: 'span',
  properties: { className: ['cell-label'], ariaHidden: 'true' },
  children: [{ type: 'text', value: `${name}: ` }],
});

function mendPart(part: Element): void {
  const role = ROLES[part.tagName];
  if (role !== undefined) part.properties['role'] = role;
  if (part.tagName === 'th') part.properties['scope'] = 'col';
  if (part.properties['align'] === 'right') part.properties['className'] = ['numeric'];
  delete part.properties['align'];
}

function mendTable(table: Element): void {
  const parts = elementsIn(table);
  parts.forEach(mendPart);
  table.properties['className'] = ['data-table'];
  const [head, ...rows] = parts.filter((part) => part.tagName === 'tr').map(cellsOf);
  const names = (head ?? []).map((cell) => textOf(cell));
  for (const row of rows) for (const [place, cell] of row.entries()) cell.children.unshift(label(names[place] ?? ''));
}

/** Tables of Markdown as our own tables: labelled blocks in a narrow window, still tables to assistive technology. */
export function mendTables(tree: Root): void {
  for (const table of elementsIn(tree)) if (table.tagName === 'table') mendTable(table);
}
