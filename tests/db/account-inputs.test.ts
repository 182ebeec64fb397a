import { describe, expect, test } from 'vitest';
import { z } from 'zod';
import { db } from '@/db/connection';
import { enqueueMail } from '@/db/outbox';
import { inTransaction } from '@/db/transaction';
import * as accounts from '@/lib/accounts/schema';
import * as stewards from '@/lib/accounts/steward-schema';
import { ok } from '@/lib/kernel/result';
import * as notices from '@/lib/notices/schema';
import { makeMailer } from '@/lib/server/mailer';
import { writeMail } from '@/lib/server/mail-text';
import { newId } from '@/lib/server/new-id';
import { sendDueMails } from '@/lib/server/work/send-mails';
import { openMailServer } from '../builders/mail-server';
import { NOW, emptyTables, key } from './account-people';

const ID = '0190a000-0000-7000-8000-000000000001';
const PASSWORD = 'slow wheel, wet hands';
const TOKEN = 'A'.repeat(43);

/** A right entry for every form of accounts, of the desk and of the outbox. A schema that is added has none, and a test says so. */
const RIGHT: Readonly<Record<string, Readonly<Record<string, unknown>>>> = {
  signUpInput: { email: 'mara@example.test', name: 'Mara', password: PASSWORD },
  signInInput: { email: 'mara@example.test', password: PASSWORD, next: '/regions' },
  mailInput: { email: 'mara@example.test', next: '/regions' },
  tokenInput: { token: TOKEN },
  resetInput: { token: TOKEN, password: PASSWORD },
  againInput: { password: PASSWORD, next: '/regions' },
  codeInput: { code: '123456', next: '/regions' },
  renameInput: { name: 'Mara' },
  passwordInput: { current: PASSWORD, password: PASSWORD },
  addressInput: { email: 'mara@example.test' },
  factorInput: { secret: 'GEZDGNBVGY3TQOJQ', code: '123456' },
  keyInput: {},
  sessionInput: { handle: '0123456789abcdef' },
  preferencesInput: { region: 'dk', currency: 'DKK', units: 'metric' },
  roleAskInput: { why: 'I know the rules', regions: 'dk' },
  requestInput: { id: ID },
  roleChangeInput: { id: ID, from: 'maker', role: 'editor', reason: 'Knows the rules' },
  closingInput: { id: ID, reason: 'Sent advertising' },
  answerInput: { id: ID, answer: 'granted', said: 'Welcome' },
  retryInput: { what: 'mail', id: ID },
};

const SCHEMAS: readonly (readonly [name: string, schema: z.ZodType])[] = [accounts, stewards, notices]
  .flatMap((all) => Object.entries(all))
  .flatMap(([name, schema]) => (name.endsWith('Input') && schema instanceof z.ZodType ? [[name, schema] as const] : []));

const right = (name: string): Record<string, unknown> => ({ key: key(), ...RIGHT[name] });

test('S26 every form of accounts, desk and outbox is tried here', () => {
  expect(SCHEMAS.map(([name]) => name).toSorted()).toEqual(Object.keys(RIGHT).toSorted());
  for (const [name, schema] of SCHEMAS) expect([name, schema.safeParse(right(name)).success]).toEqual([name, true]);
});

const columnsOf = async (): Promise<readonly string[]> => {
  const found: unknown = await db('information_schema.columns')
    .where({ table_schema: db.raw('database()') })
    .distinct({ name: 'column_name' });
  return z
    .array(z.object({ name: z.string() }))
    .parse(found)
    .map(({ name }) => name);
};

describe('S26 S36 the name of any column, sent along with a form, is refused', () => {
  test.each(SCHEMAS)('%s', async (name, schema) => {
    const columns = await columnsOf();
    expect(columns).toEqual(expect.arrayContaining(['role', 'state', 'confirmed_at', 'version', 'is_demo', 'account_id', 'password_hash']));
    const own = Object.keys(right(name));
    const more = [...columns, 'author_id', 'approved_by', 'email_verified', 'constructor', 'prototype'].filter(
      (column) => !own.includes(column),
    );
    for (const column of more) {
      expect([column, schema.safeParse({ ...right(name), [column]: 'steward' }).success]).toEqual([column, false]);
    }
    for (const evil of ['{"__proto__":{"x":"steward"}}', '{"constructor":{"prototype":{"x":"steward"}}}']) {
      schema.safeParse(Object.assign(JSON.parse(evil) as object, right(name)));
      expect(Reflect.get({}, 'x')).toBeUndefined();
    }
  });
});

const ODD: readonly unknown[] = [
  0,
  1,
  false,
  true,
  null,
  [],
  {},
  [[0]],
  [0],
  [null],
  { toString: 'x' },
  { length: 3 },
  "' or 1=1-- ",
  '\\',
  '\u0000',
  '',
  Number.POSITIVE_INFINITY,
  Number.NaN,
  1n,
  new Date(0),
  Buffer.from('mara@example.test'),
  () => 'mara@example.test',
  Symbol.iterator,
];

/** Whatever a use case is given is a text, a list of texts, or nothing: no number or object that the database would read in its own way. */
const isPlain = (given: unknown): boolean =>
  given === null ||
  given === undefined ||
  typeof given === 'string' ||
  (Array.isArray(given) && given.every((one) => typeof one === 'string'));

describe('S32 an odd value in any field is refused or read as a text', () => {
  test.each(SCHEMAS)('%s', (name, schema) => {
    for (const field of Object.keys(right(name))) {
      for (const odd of ODD) {
        const read = schema.safeParse({ ...right(name), [field]: odd });
        if (!read.success) continue;
        expect(typeof odd === 'string' || (Array.isArray(odd) && odd.length === 0 && field === 'regions')).toBe(true);
        expect([field, Object.values(read.data as object).every(isPlain)]).toEqual([field, true]);
      }
    }
    for (const odd of ODD) expect(schema.safeParse(odd).success).toBe(false);
  });
});

test('OUT-7 S38 a name with line ends and a quoted address become no header and no second recipient', async () => {
  await emptyTables();
  const hostile = 'Mara\r\nBcc: all@example.test\r\n\r\nHello';
  const read = accounts.renameInput.safeParse({ key: key(), name: hostile });
  const names = [hostile, read.success ? read.data.name : hostile];
  for (const email of [
    '"a@example.test,b"@example.test',
    '"mara"@example.test',
    'mara@example.test\r\nBcc: b@example.test',
    'a@example.test,b@example.test',
  ]) {
    expect([email, accounts.email.safeParse(email).success]).toEqual([email, false]);
  }
  const server = await openMailServer();
  for (const name of names) {
    const mail = writeMail('confirm-address', { name, link: 'http://footring.example.test/confirm/x', minutes: 60 });
    await inTransaction(db, async (trx) => {
      await enqueueMail(trx, { accountId: null, address: 'mara@example.test', mail, kind: 'tests', at: NOW });
      return ok(null);
    });
  }
  const mailer = makeMailer({ url: server.url, from: 'footring@footring.example.test' });
  const patience = { baseMs: 0, mostMs: 0 };
  const round = { db, worker: newId(NOW), mailer, from: 'footring@footring.example.test', patience, signal: new AbortController().signal };
  while ((await sendDueMails(round)).tried > 0);
  mailer.close();
  await server.close();
  expect(server.received.map(({ to }) => to)).toEqual(names.map(() => ['mara@example.test']));
  for (const { source } of server.received) expect(source.split('\r\n\r\n')[0]).not.toMatch(/^bcc:/im);
});
