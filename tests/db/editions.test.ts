import knex, { type Knex } from 'knex';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { publishEdition } from '@/db/editions';
import { connectionTo, knexSettings } from '@/db/knex-settings';
import { inTransaction } from '@/db/transaction';
import { ok } from '@/lib/kernel/result';
import { compareEditions, type EditionChoice } from '@/lib/regions/compare-editions';
import { changedMeanings, type ComparedEditions } from '@/lib/regions/domain/compared-editions';
import type { Condition } from '@/lib/regions/domain/condition';
import type { Sheet } from '@/lib/regions/domain/sheet';
import type { Ctx } from '@/lib/server/ctx';
import { aDate, seedSheets } from '../builders/seed-sheets';
import { foundSheets } from './founding';

const ctx = (now = new Date()): Ctx => ({ db, now });
let owner: Knex;

const eu = (): Sheet => {
  const sheet = seedSheets.get('eu');
  if (sheet === undefined) throw new Error('no sheet of the EU');
  return sheet;
};

const publish = (number: number, sheet: Sheet) =>
  inTransaction(owner, async (trx) => {
    await publishEdition(trx, number, { sheet, origin: 'amendment', summary: `Invented ${number}`, at: new Date() });
    return ok(null);
  });

/** Flat ware up to 30 mm; one limit with another figure, one rule withdrawn. */
const second = (): Sheet => {
  const flat: Condition = {
    any: [
      { question: 'holds-liquid', is: false },
      { question: 'depth-mm', le: { value: 30, unit: 'mm' } },
    ],
  };
  return {
    ...eu(),
    terms: eu().terms.map((term) => (term.id === 'eu-flat' ? { ...term, when: flat } : term)),
    rules: eu()
      .rules.filter(({ id }) => id !== 'eu-reach-63')
      .map((rule) =>
        rule.id === 'eu-pb-cat2' && rule.payload.topic === 'limit'
          ? { ...rule, payload: { ...rule.payload, amount: { ...rule.payload.amount, value: 2 } } }
          : rule,
      ),
    trials: [
      {
        id: 'bowl',
        title: 'Shallow bowl, 28 mm deep',
        on: aDate('2026-12-01'),
        answers: { use: 'food', form: 'bowl', 'holds-liquid': true, 'depth-mm': 28 },
        declined: [],
        expected: { 'eu-pb-cat1': 'applies', 'eu-general-safety': 'applies' },
      },
      {
        id: 'plate',
        title: 'Plate',
        on: aDate('2026-12-01'),
        answers: { use: 'food', form: 'plate', 'holds-liquid': false },
        declined: [],
        expected: { 'eu-pb-cat1': 'applies' },
      },
    ],
  };
};

const compared = async (choice: EditionChoice): Promise<ComparedEditions> => {
  const found = await compareEditions(ctx(), choice);
  if (!found.ok) throw new Error(found.error.kind);
  return found.value;
};

beforeAll(async () => {
  owner = knex({ ...knexSettings({ most: 1 }), connection: connectionTo(process.env['DATABASE_OWNER_URL'] ?? '') });
  await foundSheets();
  await publish(2, second());
  // Words alone, then back to the words and the meaning of the first.
  await publish(3, { ...second(), text: `${eu().text}\n\nOne more paragraph.` });
});
afterAll(() => owner.destroy());

test('REG-34 a changed word of the EU changes the rules of the EU and the lists of the places that read from it', async () => {
  const { items, meanings, below, names, on } = await compared({ code: 'eu', from: 1, to: 2, on: aDate('2026-12-01') });
  expect(on).toBe('2026-12-01');
  expect(items.filter(({ list }) => list !== 'trials').map(({ list, id, change }) => [list, id, change])).toEqual([
    ['rules', 'eu-pb-cat2', 'changed'],
    ['rules', 'eu-reach-63', 'withdrawn'],
    ['terms', 'eu-flat', 'changed'],
  ]);
  const flat = changedMeanings(meanings).find(({ rule }) => rule === 'eu-pb-cat1');
  expect(flat).toMatchObject({ kind: 'changed', example: { before: 'does-not-apply', after: 'applies' } });
  expect(flat?.example?.answers['depth-mm']).toBeGreaterThan(25);
  expect(flat?.example?.answers['depth-mm']).toBeLessThanOrEqual(30);
  // The figure of a limit says nothing of when it applies.
  expect(changedMeanings(meanings).map(({ rule }) => rule)).not.toContain('eu-pb-cat2');
  const denmark = below.find(({ code }) => code === 'dk');
  expect(denmark?.meanings.ok && changedMeanings(denmark.meanings).map(({ rule }) => rule)).toEqual(
    expect.arrayContaining(['eu-pb-cat1', 'eu-cd-cat1', 'eu-reach-63']),
  );
  expect(below.map(({ code }) => code)).not.toContain('us');
  expect([names.rules.get('eu-reach-63'), names.regions.get('dk'), names.terms.get('eu-flat')?.region]).toEqual([
    eu().rules.find(({ id }) => id === 'eu-reach-63')?.title,
    'Denmark',
    'eu',
  ]);
});

test('REG-34 on a day before a place joined, it is not among those below', async () => {
  // Treaty of accession: Denmark joined on 1 January 1973.
  const { below } = await compared({ code: 'eu', from: 1, to: 2, on: aDate('1972-12-31') });
  expect(below.map(({ code }) => code)).not.toContain('dk');
});

test('REG-34 editions can be compared across and with the later one first; words alone change no meaning', async () => {
  const across = await compared({ code: 'eu', from: 1, to: 3 });
  expect(across.items.map(({ list }) => list)).toContain('sheet');
  const words = await compared({ code: 'eu', from: 2, to: 3 });
  expect(words.items.map(({ list, change }) => [list, change])).toEqual([['sheet', 'changed']]);
  expect([changedMeanings(words.meanings), words.below.flatMap(({ meanings }) => changedMeanings(meanings))]).toEqual([[], []]);
  const back = await compared({ code: 'eu', from: 2, to: 1 });
  expect(back.items.find(({ id }) => id === 'eu-reach-63')?.change).toBe('added');
});

test('CHECK-83 trial pieces of both editions come out as before or are told with both statuses', async () => {
  const { trials } = await compared({ code: 'eu', from: 1, to: 2 });
  const bowl = trials.changed.find(({ id }) => id === 'bowl');
  expect(bowl?.lines).toEqual([{ rule: 'eu-pb-cat1', before: 'does-not-apply', after: 'applies' }]);
  expect(trials.changed.map(({ id }) => id)).not.toContain('plate');
  expect(trials.total).toBe(new Set([...eu().trials, ...second().trials].map(({ id }) => id)).size);
  expect(trials.unchanged + trials.unread + trials.changed.length).toBe(trials.total);
});

test('an edition that does not exist, and one edition twice, are refused', async () => {
  expect(await compareEditions(ctx(), { code: 'eu', from: 1, to: 9 })).toEqual({ ok: false, error: { kind: 'not-found' } });
  expect(await compareEditions(ctx(), { code: 'zz', from: 1, to: 2 })).toEqual({ ok: false, error: { kind: 'not-found' } });
  expect(await compareEditions(ctx(), { code: 'eu', from: 2, to: 2 })).toEqual({ ok: false, error: { kind: 'same-edition' } });
});
