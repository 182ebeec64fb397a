import type { Knex } from 'knex';
import { db } from '@/db/connection';
import { publishEdition } from '@/db/editions';
import { putRegion, replaceMemberships } from '@/db/regions';
import { inTransaction } from '@/db/transaction';
import { ok } from '@/lib/kernel/result';
import type { Rule, Source } from '@/lib/regions/domain/rule';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { emptySheet } from '@/lib/regions/domain/sheet-items';
import { aDate } from './seed-sheets';

/** An invented law text. */
export const aSource: Source = {
  id: 'xa-text',
  title: 'Order on ware',
  publisher: 'Office of Ware',
  url: 'https://ware.example.test/order',
  seenOn: aDate('2026-11-01'),
};

/** A note of an invented place that applies always. */
export const aRule = (id: string, rest: Partial<Rule> = {}): Rule => ({
  id,
  region: 'xa',
  kind: 'adds',
  targets: [],
  alongside: [],
  when: true,
  from: null,
  to: null,
  order: 10,
  firm: false,
  strength: 'note',
  standing: 'guidance',
  title: `About ${id}`,
  says: 'Sellers give their name on request.',
  payload: { topic: 'other' },
  sources: [
    {
      source: 'xa-text',
      locator: 'section 2',
      passage: 'The seller shall give a name.',
      passageLang: 'en',
      standing: 'guidance',
      evidence: 'read',
    },
  ],
  facts: [],
  lookAgainBy: aDate('2027-06-01'),
  ...rest,
});

/** A limit, which two moderators look at. */
export const aLimit = (id: string, value: number): Rule =>
  aRule(id, {
    strength: 'should',
    payload: {
      topic: 'limit',
      substance: 'Pb',
      part: 'inside',
      per: 'L',
      amount: { value, unit: 'mg/L', evidence: 'read' },
      decision: { kind: 'each', specimens: 4, evidence: 'read', atLimit: 'within' },
    },
    order: 20,
  });

export const aSheet = (code: string, rest: Partial<Sheet> = {}): Sheet => ({
  ...emptySheet(code, `Land of ${code}`, 'country'),
  languages: ['en'],
  text: 'An invented place.',
  sources: [aSource],
  rules: [aRule(`${code}-name`, { region: code })],
  ...rest,
});

/** Puts sheets in use as edition 1, as a seed does. A base layer of no rules is among them. */
export async function putWorld(sheets: readonly Sheet[], on: Knex = db): Promise<void> {
  const base = { ...emptySheet('care', 'Care', 'base'), text: 'For every place.' };
  await inTransaction(on, async (trx) => {
    for (const { code, name, kind } of [base, ...sheets]) await putRegion(trx, { code, name, kind });
    for (const sheet of [base, ...sheets]) {
      await publishEdition(trx, 1, { sheet, origin: 'seed', summary: 'Founding sheet', at: new Date('2026-01-01T00:00:00Z') });
      await replaceMemberships(trx, sheet.code, sheet.memberships);
    }
    return ok(null);
  });
}
