import { beforeAll, describe, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { compareLimits } from '@/lib/regions/compare-limits';
import { findRegions } from '@/lib/regions/find-regions';
import { listChanges } from '@/lib/regions/list-changes';
import { listRegions } from '@/lib/regions/list-regions';
import { listSources } from '@/lib/regions/list-sources';
import { readSource } from '@/lib/regions/read-source';
import { readTerm } from '@/lib/regions/read-term';
import type { Ctx } from '@/lib/server/ctx';
import { seedSheets } from '@/tests/builders/seed-sheets';
import { foundSheets } from './founding';

const ctx: Ctx = { db, now: new Date(Date.now() + 60_000) };

beforeAll(foundSheets);

/** How many queries an act sends. */
async function queriesOf(work: () => Promise<unknown>): Promise<number> {
  let sent = 0;
  const count = (): void => {
    sent += 1;
  };
  db.on('query', count);
  await work();
  db.removeListener('query', count);
  return sent;
}

test('REG-41 a place whose figures are from memory is to be confirmed; one that does not take over the limits above it has none of them', async () => {
  const known = new Map((await listRegions(ctx)).map(({ code, limits }) => [code, limits]));
  const some = ['eu', 'se', 'us-wa', 'cn', 'gb-wls', 'iso-6486', 'cl', 'no'];
  expect(some.map((code) => `${code} ${known.get(code) ?? 'missing'}`)).toEqual([
    ...['eu read', 'se read', 'us-wa read', 'cn to-confirm', 'gb-wls to-confirm', 'iso-6486 to-confirm', 'cl none', 'no none'],
  ]);
});

describe('REG-43 the finder over all places', () => {
  const found = async (asked: string) => {
    const { found: places, nearest, without } = await findRegions(ctx, asked);
    return { found: places.map(({ code }) => code), nearest: nearest.map(({ code }) => code), without: without.map(({ code }) => code) };
  };

  test('tells a place with a sheet, a country without one, a slip, and a word that is no place apart', async () => {
    expect(await found('Danmark')).toEqual({ found: ['dk'], nearest: [], without: [] });
    expect(await found('Egypt')).toEqual({ found: [], nearest: [], without: ['eg'] });
    expect(await found('Egytp')).toEqual({ found: [], nearest: [], without: ['eg'] });
    expect(await found('Danmakr')).toEqual({ found: [], nearest: ['dk'], without: [] });
    expect(await found('qqqqqq')).toEqual({ found: [], nearest: [], without: [] });
  });

  test('nothing asked shows every place but the base layer', async () => {
    const { found: all } = await found('');
    expect(all).toHaveLength([...seedSheets.values()].filter(({ kind }) => kind !== 'base').length);
  });
});

describe('REG-44 the changes of a place', () => {
  test('are those of its line, and of no other place', async () => {
    const { coming, past, narrowed } = await listChanges(ctx, { region: 'us-ca' });
    expect(narrowed?.code).toBe('us-ca');
    const codes = [...coming, ...past].flatMap(({ changes }) =>
      changes.flatMap((change) => (change.kind === 'edition' ? change.places : [change.place]).map(({ code }) => code)),
    );
    expect([...new Set(codes)].sort()).toEqual(['us', 'us-ca']);
  });

  test('an unknown place narrows nothing, and every founding sheet is told', async () => {
    const { past, narrowed } = await listChanges(ctx, { region: 'zz' });
    expect(narrowed).toBeNull();
    const founded = past.flatMap(({ changes }) => changes.flatMap((change) => (change.kind === 'edition' ? change.places : [])));
    expect(founded.map(({ code }) => code).sort()).toEqual([...seedSheets.keys()].sort());
  });
});

describe('REG-45 sources of all places', () => {
  const query = { asked: '', region: null, rule: null, page: 1 };

  test('pages hold every text once, and a page too far shows the last', async () => {
    const first = await listSources(ctx, query);
    const all = [];
    for (let page = 1; page <= first.pages; page += 1) all.push(...(await listSources(ctx, { ...query, page })).texts);
    expect(all).toHaveLength(first.count);
    expect(new Set(all.map(({ address }) => address)).size).toBe(first.count);
    expect((await listSources(ctx, { ...query, page: 9999 })).page).toBe(first.pages);
  });

  test('a rule leads to the texts it rests on, and each of them back to the rule', async () => {
    const { texts } = await listSources(ctx, { ...query, rule: 'eu-pb-cat2' });
    const rule = seedSheets.get('eu')?.rules.find(({ id }) => id === 'eu-pb-cat2');
    expect(texts.length).toBeGreaterThan(0);
    expect(texts.length).toBeLessThanOrEqual(rule?.sources.length ?? 0);
    for (const { address } of texts) {
      const text = await readSource(ctx, address);
      expect(text.ok && text.value.resting.map(({ id }) => id)).toContain('eu-pb-cat2');
    }
  });

  test('an address of no text leads nowhere', async () => {
    for (const address of ['eu--nothing', 'zz--act', 'eu', '']) {
      expect(await readSource(ctx, address)).toEqual({ ok: false, error: { kind: 'not-found' } });
    }
  });
});

test('REG-50 a word of a sheet is read by its id with what uses it, and an id of none leads nowhere', async () => {
  const read = await readTerm(ctx, 'eu-flat');
  if (!read.ok) throw new Error('There is no such word');
  expect(read.value).toMatchObject({ term: { name: 'Flat ware, EU' }, edition: 1, withdrawn: false, sheet: { code: 'eu' } });
  expect(read.value.term.sources[0]).toMatchObject({ locator: 'Art. 2(4), category 1' });
  expect(read.value.uses.rules.map(({ id }) => id)).toEqual(expect.arrayContaining(['eu-pb-cat1', 'eu-cd-cat1']));
  for (const id of ['eu-pb-cat1', 'nothing', '']) expect(await readTerm(ctx, id)).toEqual({ ok: false, error: { kind: 'not-found' } });
});

test('REG-46 a table of too many places holds eight and says how many it left out', async () => {
  const regions = ['eu', 'dk', 'de', 'fr', 'us', 'us-ca', 'ca', 'jp', 'kr', 'zz'];
  const { comparison, tooMany } = await compareLimits(ctx, { regions, symbol: 'Pb' });
  expect([comparison?.places.length, tooMany]).toEqual([8, 1]);
  expect((await compareLimits(ctx, { regions: [], symbol: 'Pb' })).comparison).toBeNull();
});

test('pages over all places send few queries, however many places there are', async () => {
  await listChanges(ctx, { region: null });
  const sent = [
    await queriesOf(() => findRegions(ctx, 'dan')),
    await queriesOf(() => listChanges(ctx, { region: null })),
    await queriesOf(() => listSources(ctx, { asked: '', region: null, rule: null, page: 1 })),
    await queriesOf(() => compareLimits(ctx, { regions: ['eu'], symbol: 'Pb' })),
  ];
  expect(sent.filter((count) => count > 6)).toEqual([]);
});
