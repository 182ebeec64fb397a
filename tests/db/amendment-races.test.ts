import { beforeAll, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { findEdition, findNumberInUse } from '@/db/editions';
import type { Result } from '@/lib/kernel/result';
import type { AmendmentId } from '@/lib/regions/domain/amendment';
import { keepEntry } from '@/lib/regions/keep-entry';
import { saveItem } from '@/lib/regions/save-item';
import { sendAmendment } from '@/lib/regions/send-amendment';
import { sendBackAmendment } from '@/lib/regions/send-back-amendment';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { aSheet, putWorld } from '../builders/small-world';
import { key, mailsOf } from './account-people';
import { aDraft, approve, readAll, send, someone, SUMMARY, value } from './amendment-people';

const ROUNDS = 200;

let author: ActorCtx;
let mo: ActorCtx;
let ada: ActorCtx;
beforeAll(async () => {
  await putWorld([aSheet('xa'), aSheet('xb'), aSheet('xc')]);
  [author, mo, ada] = [await someone('editor', 'Ida'), await someone('moderator', 'Mo'), await someone('moderator', 'Ada')];
});

/** The last word of a text, as one moderator meets it, sent and read by both. */
async function waiting(round: number): Promise<{ readonly id: AmendmentId; readonly version: number }> {
  const id = await aDraft(author, 'xa', (sheet) => ({ ...sheet, text: `Round ${String(round)}.` }));
  return { id, version: await send(author, id) };
}

const decisionsOn = async (id: string): Promise<readonly unknown[]> => db('amendment_decisions').where({ amendment_id: id }).pluck('kind');
const linesOn = async (id: string): Promise<readonly unknown[]> => db('day_book').where({ subject_id: id }).orderBy('number').pluck('did');

type Outcome = Result<unknown, { readonly kind: string }>;
const kindsOf = (outcomes: readonly Outcome[]): readonly string[] => outcomes.map((one) => (one.ok ? 'yes' : one.error.kind)).sort();

test('REG-56 F10 two moderators at once, 200 rounds: one decides, the other is told who; one edition or none, one line, one mail', async () => {
  let editions = 1;
  let back = 0;
  for (let round = 0; round < ROUNDS; round += 1) {
    const { id, version } = await waiting(round);
    const sendBack = () => sendBackAmendment(ada, { key: key(), id, version, reason: 'One word is missing.' });
    const isTwice = round % 2 === 0;
    const outcomes = await Promise.all<Outcome>([approve(mo, id, version), isTwice ? approve(ada, id, version) : sendBack()]);
    const said = `round ${String(round)} ${JSON.stringify(outcomes)}`;
    expect(kindsOf(outcomes), said).toEqual(['already-decided', 'yes']);
    const winner = outcomes[0]?.ok === true ? 'Mo' : 'Ada';
    expect(
      outcomes.find((one) => !one.ok),
      said,
    ).toMatchObject({ error: { by: winner } });
    const [kind] = await decisionsOn(id);
    const isInUse = kind === 'approve';
    editions += isInUse ? 1 : 0;
    back += isInUse ? 0 : 1;
    expect(await decisionsOn(id), said).toHaveLength(1);
    expect(await linesOn(id), said).toEqual(['amendment.send', isInUse ? 'amendment.approve' : 'amendment.send-back']);
    expect(await findNumberInUse(db, 'xa'), said).toBe(editions);
  }
  expect(await mailsOf('amendment-decided')).toHaveLength(ROUNDS);
  expect(back).toBeGreaterThan(0);
  const numbers: unknown[] = await db('editions').where({ region: 'xa' }).orderBy('number').pluck('number');
  expect(numbers).toEqual(Array.from({ length: editions }, (_, index) => index + 1));
  console.log(`F10: ${String(editions - 1)} editions, ${String(back)} sent back`);
}, 180_000);

test('REG-57 F11 two tabs keep one form at once, 100 rounds: one text stands, the other tab is told it and keeps its own', async () => {
  const id = await aDraft(author, 'xb', (sheet) => sheet);
  let version = 0;
  for (let round = 0; round < 100; round += 1) {
    const tab = (name: string) => keepEntry(author, { id, item: 'text', version, values: { text: `${name} ${String(round)}` } });
    const outcomes = await Promise.all([tab('first'), tab('second')]);
    const stands = outcomes.find((one) => one.ok);
    const other = outcomes.find((one) => !one.ok);
    const text = outcomes[0].ok ? `first ${String(round)}` : `second ${String(round)}`;
    if (stands?.ok !== true) throw new Error('Neither was kept');
    version = stands.value.version;
    expect(other).toEqual({ ok: false, error: { kind: 'entry-moved-on', version, values: { text } } });
  }
  const values = { text: 'The last one.' };
  const saved = await Promise.all([
    saveItem(author, { key: key(), id, item: 'text', version, values }),
    saveItem(author, { key: key(), id, item: 'text', version, values }),
  ]);
  expect(kindsOf(saved)).toEqual(['entry-moved-on', 'yes']);
}, 60_000);

test('REG-53 REG-59 F11 two amendments on one base are approved at once, 100 rounds: one is in use, the other goes back', async () => {
  let number = 1;
  for (let round = 0; round < 100; round += 1) {
    const ids = [];
    for (const part of ['text', 'gaps'] as const) {
      const said = `${part} ${String(round)}`;
      const id = await aDraft(author, 'xc', (sheet) => ({ ...sheet, ...(part === 'text' ? { text: said } : { gaps: [said] }) }));
      ids.push({ id, version: await send(author, id) });
    }
    const outcomes = (await Promise.all(ids.map(({ id, version }, place) => approve(place === 0 ? mo : ada, id, version)))).map(
      (one) => value(one).outcome,
    );
    number += 1;
    expect(outcomes.toSorted()).toEqual(['in-use', 'refused-stale']);
    expect(await findNumberInUse(db, 'xc')).toBe(number);
    const sheet = (await findEdition(db, 'xc', number))?.sheet;
    if (outcomes[0] === 'in-use') expect(sheet?.text).toBe(`text ${String(round)}`);
    else expect(sheet?.gaps).toEqual([`gaps ${String(round)}`]);
  }
}, 180_000);

test('REG-56 F09 the same form sent 50 times at once is one act; another form under its key is refused', async () => {
  const id = await aDraft(author, 'xb', (sheet) => ({ ...sheet, text: 'Sent once.' }));
  const once = key();
  const sending = { key: once, id, version: 1, summary: SUMMARY, intended: {} };
  const outcomes = await Promise.all(Array.from({ length: 50 }, () => sendAmendment(author, sending)));
  expect(outcomes.every((one) => (one.ok ? one.value.version === 2 : one.error.kind === 'busy'))).toBe(true);
  expect(outcomes.some(({ ok }) => ok)).toBe(true);
  expect(await linesOn(id)).toEqual(['amendment.send']);
  expect(await sendAmendment(author, { ...sending, summary: 'Another summary.' })).toMatchObject({
    ok: false,
    error: { kind: 'key-reused' },
  });
  await readAll(mo, id);
  const keys = Array.from({ length: 50 }, key);
  const approvals = await Promise.all(keys.map(() => approve(mo, id, 2)));
  expect(kindsOf(approvals).filter((kind) => kind === 'yes')).toHaveLength(1);
  expect(await decisionsOn(id)).toEqual(['approve']);
}, 60_000);
