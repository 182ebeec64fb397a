import type { Element, Root, RootContent } from 'hast';

/** Every element at or below a node, in the order of the page. Counted without recursion: the depth is the writer's. */
export function elementsIn(node: Root | Element): readonly Element[] {
  const found: Element[] = [];
  const open: (Root | RootContent)[] = [node];
  for (let next = open.pop(); next !== undefined; next = open.pop()) {
    if (next.type === 'element') found.push(next);
    if ('children' in next) open.push(...next.children.toReversed());
  }
  return found;
}
