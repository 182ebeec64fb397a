import { valuesOf, type Values } from '@/lib/server/define-action';

/** Fields of the form itself: everything else in it belongs to the item. */
const OWN = ['key', 'id', 'item', 'version', 'do'] as const;

export type SentEntry = Readonly<Record<(typeof OWN)[number], string>> & { readonly values: Values };

const lineEnds = (value: string): string => value.replaceAll(/\r\n?/g, '\n');

/** What an item's form sent: line ends as a script would send them, so that both ways of keeping it keep the same. */
export function sentEntry(form: FormData): SentEntry {
  const all = Object.entries(valuesOf(form)).map(
    ([name, value]) => [name, typeof value === 'string' ? lineEnds(value) : value.map(lineEnds)] as const,
  );
  const text = (name: string): string => [all.find(([other]) => other === name)?.[1] ?? ''].flat()[0] ?? '';
  const values = Object.fromEntries(all.filter(([name]) => !OWN.some((own) => own === name)));
  return { key: text('key'), id: text('id'), item: text('item'), version: text('version'), do: text('do'), values };
}
