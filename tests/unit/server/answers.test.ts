import { expect, test } from 'vitest';
import { answering } from '@/lib/server/api';
import { fateOf } from '@/lib/server/database-errors';
import { Unavailable } from '@/lib/server/unavailable';

const SECRET = 'select `password_hash` from `accounts` where `email` = mira@example.test';
const PLACE = '/srv/footring/lib/server/secret.ts';

const fault = (fields: object): Error =>
  Object.assign(new Error(`${SECRET} at ${PLACE}`), { sql: SECRET, stack: `Error\n at ${PLACE}:1:1`, ...fields });

const FAULTS: readonly (readonly [name: string, thrown: Error, status: number])[] = [
  ['a plain error', fault({}), 500],
  ['a duplicate', fault({ errno: 1062, code: 'ER_DUP_ENTRY' }), 500],
  ['a table that is not there', fault({ errno: 1146, code: 'ER_NO_SUCH_TABLE' }), 500],
  ['a right that is missing', fault({ errno: 1142, code: 'ER_TABLEACCESS_DENIED_ERROR' }), 500],
  ['an error with a cause', new Error('outer', { cause: fault({}) }), 500],
  ['a slow statement', fault({ errno: 1969 }), 503],
  ['a lost connection', fault({ code: 'PROTOCOL_CONNECTION_LOST' }), 503],
  ['a server that is not there', fault({ code: 'ECONNREFUSED' }), 503],
  ['a node that is not ready', fault({ errno: 1047 }), 503],
  ['a change without an end', new Unavailable(7, { cause: fault({}) }), 503],
];

test.each(FAULTS)('SRV-18 S54 %s is told without a word of it', async (_, thrown, status) => {
  const answer = await answering(() => Promise.reject(thrown));
  const said = (await answer.text()) + JSON.stringify([...answer.headers]);
  expect(answer.status).toBe(status);
  for (const word of ['password_hash', 'mira', '/srv', 'ER_', 'Error', 'stack', 'outer']) expect(said).not.toContain(word);
  expect(answer.headers.has('retry-after')).toBe(status === 503);
  if (status === 500) expect(said).toMatch(/\([0-9a-f-]{36}\)/);
});

test('SRV-4 what is certainly rolled back is tried again; a commit without an end is not taken for one', () => {
  for (const errno of [1213, 1020, 1205, 1047, 1053, 1317, 1927, 1290]) expect(fateOf(fault({ errno })), String(errno)).toBe('rolled-back');
  const lost = ['PROTOCOL_CONNECTION_LOST', 'ECONNRESET', 'ECONNREFUSED', 'EPIPE', 'ETIMEDOUT', 'ER_ERROR_DURING_COMMIT'];
  for (const code of lost) expect(fateOf(fault({ code })), code).toBe('unknown');
  expect(fateOf(Object.assign(new Error('Timeout acquiring a connection'), { name: 'KnexTimeoutError' }))).toBe('unknown');
  expect(fateOf(new Error("Can't add new command when connection is in closed state"))).toBe('unknown');
  for (const errno of [1062, 1451, 1452, 1406, 1142, 1146]) expect(fateOf(fault({ errno })), String(errno)).toBe('broken');
  for (const strange of [null, undefined, 'ECONNRESET', { errno: 1213 }, new Error('x')]) expect(fateOf(strange)).toBe('broken');
});
