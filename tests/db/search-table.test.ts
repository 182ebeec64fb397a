import { readFileSync } from 'node:fs';
import { beforeAll, expect, test } from 'vitest';
import { z } from 'zod';
import { searchPages } from '@/lib/search/search-pages';
import { makeCtx } from '@/lib/server/ctx';
import { foundAll } from './founding';

/** What readers ask, in whose words, and the page that answers it best. */
const queries = z
  .array(z.object({ kind: z.string(), q: z.string(), first: z.string() }))
  .parse(JSON.parse(readFileSync(new URL('../cases/search/queries.json', import.meta.url), 'utf8')));

beforeAll(foundAll);

type Outcome = { readonly q: string; readonly first: string; readonly got: readonly string[] };

const share = (met: number, of: number): string => `${met} of ${of} (${((100 * met) / of).toFixed(1)} %)`;

test('SRCH-1 at least 19 of 20 readers’ questions find their page first, and all of them among the first three', async () => {
  const outcomes: Outcome[] = [];
  for (const { q, first } of queries) {
    const { hits } = await searchPages(makeCtx(), { q, kind: null, region: null, offset: 0, limit: 3 });
    outcomes.push({ q, first, got: hits.map(({ address }) => address) });
  }
  const notFirst = outcomes.filter(({ first, got }) => got[0] !== first);
  const notThree = outcomes.filter(({ first, got }) => !got.includes(first));
  const all = queries.length;
  console.log(`hit@1 ${share(all - notFirst.length, all)}, hit@3 ${share(all - notThree.length, all)}`);
  for (const { q, first, got } of notFirst) console.log(`"${q}" should find ${first}, found ${got.join(' ')}`);
  expect(all).toBeGreaterThanOrEqual(120);
  expect(notThree).toEqual([]);
  expect((all - notFirst.length) / all).toBeGreaterThanOrEqual(0.95);
}, 120_000);
