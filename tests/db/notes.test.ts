import { beforeAll, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { inTransaction } from '@/db/transaction';
import { publishEdition } from '@/db/editions';
import { ok } from '@/lib/kernel/result';
import { findRestingRules } from '@/lib/notes/find-resting-rules';
import { seedSheets } from '../builders/seed-sheets';
import { foundSheets } from './founding';

beforeAll(foundSheets);

test('NOTE-10 under a note stand the rules of the base layer in use that carry one of its facts, and no others', async () => {
  const care = seedSheets.get('care');
  const carrying = care?.rules.filter(({ facts }) => facts.includes('hy-05')).map(({ id }) => id) ?? [];
  const found = await findRestingRules({ db, now: new Date() }, ['hy-05']);
  expect(found.map(({ id }) => id)).toEqual(carrying);
  expect(found.map(({ id }) => id)).toContain('care-crazed');
  expect(await findRestingRules({ db, now: new Date() }, ['no-such-fact'])).toEqual([]);
});

test('NOTE-10 a rule that the edition in use has dropped no longer rests on anything', async () => {
  const care = seedSheets.get('care');
  if (care === undefined) throw new Error('no base layer');
  const sheet = { ...care, rules: care.rules.filter(({ id }) => id !== 'care-crazed') };
  await inTransaction(db, async (trx) =>
    ok(await publishEdition(trx, 2, { sheet, origin: 'amendment', summary: 'A rule less', at: new Date(Date.now() - 1000) })),
  );
  const found = await findRestingRules({ db, now: new Date() }, ['hy-05']);
  expect(found.map(({ id }) => id)).not.toContain('care-crazed');
});
