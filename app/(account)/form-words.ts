import { words } from '@/lib/kernel/words';

const MOST_FAULTS = 5;

/** What every form says of itself, in words alone, as a form in the browser takes it. */
export const formWords = (): { readonly busy: string; readonly headings: readonly string[] } => ({
  busy: words('accounts.act.busy'),
  headings: Array.from({ length: MOST_FAULTS }, (_, at) => words('accounts.fault.heading', { count: at + 1 })),
});

export type Query = Readonly<Record<string, string | string[] | undefined>>;

/** One value of a query. */
export const one = (query: Query, name: string): string | undefined => [query[name]].flat()[0];
