import 'server-only';
import { listTitles, searchRevision } from '@/db/search';
import { words } from '@/lib/kernel/words';
import type { Ctx } from '@/lib/server/ctx';
import { keep } from '@/lib/server/keep';
import type { SearchKind } from './domain/entry';
import { MOST_SUGGESTED, type CompactEntry, type SuggestionIndex } from './domain/suggestion';

/** Few kinds of entries grow without end; of those only so many are suggested, so that the index stays small. */
const MOST: Readonly<Partial<Record<SearchKind, number>>> = { note: 500, word: 300, region: 300, term: 200, rule: 700 };
const KINDS = ['note', 'word', 'region', 'term', 'rule'] as const;
/** Other names in the reader's hands; all of them are known to the search itself. */
const MOST_NAMES = 12;

type Kept = { readonly of: Ctx['db']; readonly read: (revision: string) => Promise<SuggestionIndex | null> };
let kept: Kept | null = null;

/** What suggestions are made of, from the editions in use. Kept in memory until an entry comes or goes. */
export async function readSuggestionIndex(ctx: Ctx): Promise<SuggestionIndex> {
  if (kept?.of !== ctx.db) kept = { of: ctx.db, read: keep(1, () => makeIndex(ctx)) };
  return (await kept.read(await searchRevision(ctx.db))) ?? makeIndex(ctx);
}

async function makeIndex({ db }: Ctx): Promise<SuggestionIndex> {
  const lists = await Promise.all(KINDS.map((kind) => listTitles(db, kind, MOST[kind] ?? 0)));
  const entries = lists.flat().map(({ kind, region, slug, title, also }): CompactEntry => {
    const names = kind === 'rule' ? '' : also.slice(0, MOST_NAMES).join(';');
    const of = kind === 'region' ? '' : region;
    return names === '' ? [kind, of, slug, title] : [kind, of, slug, title, names];
  });
  return {
    label: words('search.field.suggestions'),
    kinds: {
      note: words('search.kinds.note'),
      word: words('search.kinds.word'),
      region: words('search.kinds.region'),
      term: words('search.kinds.term'),
      rule: words('search.kinds.rule'),
      source: words('search.kinds.source'),
    },
    counts: Array.from({ length: MOST_SUGGESTED + 1 }, (_, count) => words('search.field.suggestionCount', { count })),
    entries,
  };
}
