import { gzipSync } from 'node:zlib';
import { beforeAll, describe, expect, test } from 'vitest';
import { z } from 'zod';
import { GET as getNotes } from '@/app/api/v1/notes/route';
import { GET as getIndex } from '@/app/api/v1/search-index/route';
import { GET as getSearch } from '@/app/api/v1/search/route';
import { db } from '@/db/connection';
import { listEditions, lockSheet, publishEdition } from '@/db/editions';
import { findCandidates } from '@/db/search';
import { inTransaction } from '@/db/transaction';
import { ok } from '@/lib/kernel/result';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { readEdition } from '@/lib/server/sheets';
import { foundAll } from './founding';

const AT = 'http://localhost:3000/api/v1';
const reply = z.looseObject({
  hits: z.array(z.looseObject({ address: z.string(), isHere: z.boolean() })),
  count: z.number(),
  nearest: z.array(z.string()),
  mended: z.array(z.object({ from: z.string(), to: z.string() })),
  after: z.string().nullable(),
});

const ask = (parameters: Record<string, string>) => getSearch(new Request(`${AT}/search?${new URLSearchParams(parameters).toString()}`));
const search = async (parameters: Record<string, string>) => reply.parse(await (await ask(parameters)).json());
const addresses = async (parameters: Record<string, string>) => (await search(parameters)).hits.map(({ address }) => address);

beforeAll(foundAll);

async function publish(code: string, change: (sheet: Sheet) => Sheet): Promise<void> {
  const last = (await listEditions(db, code)).at(-1)?.number ?? 0;
  const edition = await readEdition(db, code, last);
  if (edition === null) throw new Error(`${code} has no sheet`);
  await inTransaction(db, async (trx) => {
    await lockSheet(trx, code);
    await publishEdition(trx, last + 1, { sheet: change(edition.sheet), origin: 'amendment', summary: 'A test', at: new Date() });
    return ok(null);
  });
}

const allWords = async (): Promise<unknown> => {
  const rows: unknown[] = await db('search_words').orderBy('word').select('word', 'uses');
  return rows;
};

describe('editions', () => {
  test('SRCH-2, SRCH-8 a word of an edition is found while that edition is in use, and by nothing after it', async () => {
    const before = await allWords();
    const canary = 'Zwirbelquark';
    await publish('hk', (sheet) => ({ ...sheet, text: `${sheet.text}\n\n${canary} is said here.` }));
    expect(await addresses({ q: canary })).toContain('/regions/hk');
    await publish('hk', (sheet) => ({ ...sheet, text: sheet.text.replace(`\n\n${canary} is said here.`, '') }));
    const after = await search({ q: canary });
    expect([after.count, after.mended]).toEqual([0, []]);
    for (const q of ['zwirbelquarg', 'zwirbel', 'zwirbelquar'])
      expect(JSON.stringify(await search({ q })).replaceAll(q, '')).not.toMatch(/zwirbel/i);
    expect(await (await getIndex(new Request(`${AT}/search-index`))).text()).not.toMatch(/zwirbel/i);
    expect(await allWords()).toEqual(before);
  });
});

const HOSTILE: readonly string[] = [
  '"',
  '+',
  '-lead +',
  '+*',
  '(((((',
  '"unclosed lead',
  '@distance 5',
  '~lead <cadmium >cobalt',
  '%',
  '\\',
  '\\\\%_\\',
  '\u0000',
  'le\u0000ad',
  '\u202egnizarc',
  '\u200f\u200elead',
  '\ud800',
  'lead\udfff',
  "' or 1=1-- ",
  "'; drop table search_entries; --",
  '(a+)+$',
  'a'.repeat(200),
  'ab '.repeat(66),
  'haarrisse'.repeat(22),
  '́'.repeat(200),
  '﷽'.repeat(200),
  'ß'.repeat(200),
  '{{{{[[[[',
  '__proto__',
  'constructor',
  'toString',
  '漢字かな',
  '🍞🍞🍞',
  'xclead xrdk',
];

describe('hostile questions', () => {
  test('SRCH-3, S32, S37 are answered, and cost less than 200 ms of processor time each', async () => {
    await search({ q: 'lead' });
    const slow: unknown[] = [];
    for (const q of HOSTILE) {
      const before = process.cpuUsage();
      const answer = await ask({ q });
      const { user, system } = process.cpuUsage(before);
      expect([q, answer.status]).toEqual([q, 200]);
      if (user + system > 200_000) slow.push([q, (user + system) / 1000]);
    }
    expect(slow).toEqual([]);
  });

  test('SRCH-4, S49 200 characters are read and 201 are refused, as are 10 kB', async () => {
    expect((await ask({ q: 'x'.repeat(200) })).status).toBe(200);
    for (const length of [201, 10_000]) expect((await ask({ q: 'x'.repeat(length) })).status).toBe(422);
  });

  test('SRCH-4 fields that are none, and values that fit none, are refused', async () => {
    const wrong = [
      { q: '' },
      { kind: 'note' },
      { q: 'a', kind: 'pot' },
      { q: 'a', region: "dk' or" },
      { q: 'a', limit: '101' },
      { q: 'a', limit: '0' },
      { q: 'a', after: '!' },
      { q: 'a', odd: '1' },
    ];
    for (const parameters of wrong) expect([parameters, (await ask(parameters)).status]).toEqual([parameters, 422]);
    expect((await ask({ q: 'lead', limit: '100' })).status).toBe(200);
  });
});

describe('candidates', () => {
  const scores = z.array(z.object({ score: z.number() }).transform(({ score }) => score));

  test.each([
    ['+lead', 'all_words', []],
    ['+lead +cadmium', 'all_words', []],
    ['lead rim cadmium', 'all_words', ['rule']],
    ['+lead', 'heading_words', ['note', 'word', 'region', 'term']],
  ] as const)('SRCH-11 of what has %s in its %s (%j) the likeliest are found', async (words, where, kinds) => {
    const found = await findCandidates(db, { words, where, kinds, most: 15 });
    const sorted: unknown = await db('search_entries')
      .whereRaw('match(??) against (? in boolean mode)', [where, words])
      .where((builder) => {
        if (kinds.length > 0) void builder.whereIn('kind', kinds);
      })
      .select(db.raw('match(??) against (? in boolean mode) as score', [where, words]))
      .orderBy('score', 'desc')
      .limit(15);
    expect(found.length).toBeGreaterThan(3);
    expect(found.map(({ score }) => score)).toEqual(scores.parse(sorted));
  });
});

describe('places', () => {
  test('SRCH-5 what holds in the reader’s place stands first, and nothing found without it is missing', async () => {
    const { hits } = await search({ q: 'declaration', region: 'dk', limit: '100' });
    const here = hits.map(({ isHere }) => isHere);
    expect(here).toEqual(here.toSorted((a, b) => Number(b) - Number(a)));
    expect(hits.filter(({ isHere }) => isHere).map(({ address }) => address)).toContain('/rules/dk-doc');
    expect(hits.find(({ address }) => address.startsWith('/rules/de-'))?.isHere).toBe(false);
    const anywhere = await addresses({ q: 'declaration', limit: '100' });
    expect(hits.map(({ address }) => address)).toEqual(expect.arrayContaining(anywhere.slice(0, 20)));
  });

  test('SRCH-5 a kind narrows to that kind', async () => {
    for (const kind of ['note', 'word', 'region', 'term', 'rule', 'source']) {
      const found = await addresses({ q: 'lead ceramic', kind });
      expect([kind, found.every((address) => address.startsWith(`/${kind}s/`))]).toEqual([kind, true]);
    }
  });
});

describe('lists', () => {
  test('SRCH-9 leafing through answers meets each once and ends', async () => {
    const met: string[] = [];
    let after: string | null = null;
    do {
      const page: z.output<typeof reply> = await search({ q: 'lead', limit: '33', ...(after === null ? {} : { after }) });
      met.push(...page.hits.map(({ address }) => address));
      after = page.after;
    } while (after !== null && met.length < 1000);
    expect(new Set(met).size).toBe(met.length);
    expect(met.length).toBe((await search({ q: 'lead' })).count);
  });

  test('SRCH-9 the list of notes leads on by its Link and holds every note once', async () => {
    const page = z.object({
      notes: z.array(z.looseObject({ slug: z.string(), summary: z.string().min(20) })),
      after: z.string().nullable(),
    });
    const met: string[] = [];
    let path: string | null = '/api/v1/notes?limit=7';
    while (path !== null && met.length < 1000) {
      const answer: Response = await getNotes(new Request(`http://localhost:3000${path}`));
      met.push(...page.parse(await answer.json()).notes.map(({ slug }) => slug));
      path = /<([^>]+)>; rel="next"/.exec(answer.headers.get('link') ?? '')?.[1] ?? null;
    }
    const rows: unknown[] = await db('search_entries').where({ kind: 'note' }).orderBy('slug').pluck('slug');
    expect(met).toEqual(rows);
    expect(met.length).toBeGreaterThanOrEqual(24);
  });

  test('SRCH-10 the suggestion index is small, and not sent to who has it', async () => {
    const answer = await getIndex(new Request(`${AT}/search-index`));
    const size = gzipSync(await answer.text()).length;
    console.log(`Suggestion index: ${(size / 1000).toFixed(1)} kB gzip`);
    expect(size).toBeLessThanOrEqual(40_000);
    const again = await getIndex(new Request(`${AT}/search-index`, { headers: { 'if-none-match': answer.headers.get('etag') ?? '' } }));
    expect(again.status).toBe(304);
  });
});
