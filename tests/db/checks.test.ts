import { beforeAll, beforeEach, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { answerQuestion } from '@/lib/checks/answer-question';
import { beginCheck } from '@/lib/checks/begin-check';
import { changePlaces } from '@/lib/checks/change-places';
import { keepCheckCopy } from '@/lib/checks/keep-check-copy';
import { readCheck } from '@/lib/checks/read-check';
import { readCopy } from '@/lib/checks/read-copy';
import { readQuestionPage } from '@/lib/checks/read-question-page';
import { readResult } from '@/lib/checks/read-result';
import { answerInput, beginInput, checkId, copyHash } from '@/lib/checks/schema';
import { showChecklist } from '@/lib/checks/show-checklist';
import { findQuestion } from '@/lib/checks/domain/steps';
import type { Ctx } from '@/lib/server/ctx';
import { foundSheets } from './founding';

const at = (now: string): Ctx => ({ db, now: new Date(now) });
const today = at('2026-12-01T10:00:00Z');
const ID = checkId.parse('AAAAAAAAAAAAAAAAAAAAAA');

const begin = (regions: readonly string[], ctx: Ctx = today) => beginCheck(ctx, beginInput.parse({ key: ID, regions, saleOn: '' }));
const say = (question: string, fields: Record<string, string[]>, asked = [question], ctx: Ctx = today) =>
  answerQuestion(ctx, answerInput.parse({ id: ID, question, asked, fields }));

async function checkNow(ctx: Ctx = today) {
  const read = await readCheck(ctx, ID);
  if (!read.ok) throw new Error('The check is gone');
  return read.value;
}

beforeAll(foundSheets);
beforeEach(async () => {
  await db('checks').del();
});

test('CHECK-40 a check begun twice by the same form is one check, and keeps what was answered between', async () => {
  await begin(['dk']);
  await say('use', { use: ['food'] });
  expect(await begin(['dk'])).toEqual({ ok: true, value: { id: ID } });
  expect((await checkNow()).check.answers).toEqual({ use: 'food' });
});

test('CHECK-41 a place without a sheet is refused by name and begins nothing', async () => {
  expect(await begin(['dk', 'zz'])).toEqual({ ok: false, error: { kind: 'unknown-region', code: 'zz' } });
  expect(await begin([])).toEqual({ ok: false, error: { kind: 'no-region' } });
  expect(await readCheck(today, ID)).toEqual({ ok: false, error: { kind: 'not-found' } });
});

test('CHECK-42 an entry that is not understood changes no answer and is shown again as typed', async () => {
  await begin(['dk']);
  await say('depth-mm', { 'depth-mm': ['62'], 'capacity-ml': ['350'] }, ['depth-mm', 'capacity-ml']);
  const refused = await say('depth-mm', { 'depth-mm': ['sixty-two'], 'capacity-ml': ['400'] }, ['depth-mm', 'capacity-ml']);
  expect(refused).toEqual({
    ok: false,
    error: { kind: 'not-understood', faults: [{ question: 'depth-mm', field: 'depth-mm', why: 'not-a-number' }] },
  });
  expect((await checkNow()).check.answers).toEqual({ 'depth-mm': 62, 'capacity-ml': 350 });
  const question = findQuestion('depth-mm');
  if (question === null) throw new Error('no such question');
  const page = await readQuestionPage(today, { id: ID, question, look: true });
  expect(page).toMatchObject({ ok: true, value: { fields: { 'depth-mm': ['sixty-two'], 'capacity-ml': ['400'] } } });
});

test('CHECK-43 an empty field is neither no nor zero: it is refused, and "I don’t know yet" is kept apart from both', async () => {
  await begin(['dk']);
  expect(await say('cooked-in', {})).toMatchObject({ ok: false, error: { faults: [{ why: 'nothing-said' }] } });
  await say('cooked-in', { 'cooked-in': ['unknown'] });
  const { check, stillMatters } = await checkNow();
  expect(check.answers).toEqual({});
  expect(check.declined).toEqual(['cooked-in']);
  expect(stillMatters).not.toContain('cooked-in');
});

test('CHECK-44 answers given at once in two tabs are both kept', async () => {
  await begin(['dk']);
  await Promise.all([say('use', { use: ['food'] }), say('form', { form: ['mug'] }), say('heat', { heat: ['none'] })]);
  expect((await checkNow()).check.answers).toEqual({ use: 'food', form: 'mug', heat: [] });
});

test('CHECK-45 a check is gone 30 days after it was last touched, and beginning another one clears it away', async () => {
  await begin(['dk']);
  await say('use', { use: ['food'] });
  expect(await readCheck(at('2026-12-31T10:00:00Z'), ID)).toMatchObject({ ok: true });
  const later = at('2026-12-31T10:00:01Z');
  expect(await readCheck(later, ID)).toEqual({ ok: false, error: { kind: 'not-found' } });
  expect(await say('form', { form: ['mug'] }, ['form'], later)).toEqual({ ok: false, error: { kind: 'not-found' } });
  await beginCheck(later, beginInput.parse({ key: 'BBBBBBBBBBBBBBBBBBBBBB', regions: ['eu'], saleOn: '' }));
  expect(await db('checks').pluck('id')).toEqual(['BBBBBBBBBBBBBBBBBBBBBB']);
});

test('CHECK-46 changing the places keeps every answer', async () => {
  await begin(['dk']);
  await say('use', { use: ['food'] });
  await changePlaces(today, beginInput.parse({ key: ID, regions: ['us-ca', 'jp'], saleOn: '2027-03-01' }));
  expect((await checkNow()).check).toMatchObject({ regions: ['us-ca', 'jp'], saleOn: '2027-03-01', answers: { use: 'food' } });
});

const beginFrom = (fromNote: unknown) => beginCheck(today, beginInput.parse({ key: ID, regions: ['dk'], saleOn: '', fromNote }));

async function shownFor(id: string) {
  const question = findQuestion(id);
  if (question === null) throw new Error('no such question');
  const page = await readQuestionPage(today, { id: ID, question, look: false });
  if (!page.ok) throw new Error('The check is gone');
  const { fields, fromNote, suggested } = page.value;
  return { fields, fromNote, suggested };
}

test.each([
  ['crazed:yes', 'crazed', ['yes']],
  ['absorption-percent:3', 'absorption-percent', ['3']],
  ['channel:market-stall', 'channel', ['market-stall']],
  ['colourants:copper', 'colourants', ['copper']],
])('CHECK-51 the answer of a note (%s) is filled in and marked, and counts once it is sent', async (fromNote, id, filled) => {
  await beginFrom(fromNote);
  expect((await checkNow()).check.answers).toEqual({});
  expect(await shownFor(id)).toEqual({ fields: { [id]: filled }, fromNote: [id], suggested: [] });
  await say(id, { [id]: filled });
  expect(Object.keys((await checkNow()).check.answers)).toEqual([id]);
  expect((await shownFor(id)).fromNote).toEqual([]);
});

test('CHECK-51 what the maker says in its place stands, and a note’s answer goes before what the form suggests', async () => {
  await beginFrom('holds-liquid:no');
  await say('form', { form: ['mug'] });
  expect(await shownFor('holds-liquid')).toEqual({ fields: { 'holds-liquid': ['no'] }, fromNote: ['holds-liquid'], suggested: [] });
  await say('holds-liquid', { 'holds-liquid': ['yes'] });
  expect(await shownFor('holds-liquid')).toEqual({ fields: { 'holds-liquid': ['yes'] }, fromNote: [], suggested: [] });
});

test('CHECK-51 what is no answer of a note fills in nothing and stops nobody', async () => {
  const others = [
    'crazed:maybe',
    'nothing:yes',
    'crazed',
    'crazed:yes:no',
    'seller-region:dk',
    'depth-mm:-1',
    'x'.repeat(500),
    '__proto__:yes',
    '',
    7,
  ];
  for (const other of others) {
    await db('checks').del();
    expect([other, await beginFrom(other)]).toEqual([other, { ok: true, value: { id: ID } }]);
    expect((await checkNow()).check.fromNote).toEqual({});
  }
});

test('CHECK-47 turnover in one currency leaves the other currency open without asking for ever', async () => {
  await begin(['dk', 'us-ca']);
  const asked = ['turnover-a-year'];
  await say('turnover-a-year', { 'turnover-a-year.DKK': ['40000'], 'turnover-a-year.USD': [''] }, asked);
  const { check, stillMatters } = await checkNow();
  expect(check.answers['turnover-a-year']).toEqual([{ amount: '40000', currency: 'DKK' }]);
  expect(stillMatters).not.toContain('turnover-a-year');
});

test('CHECK-48 after a changed answer the list says what changed since the one shown before', async () => {
  await begin(['dk']);
  await say('use', { use: ['food'] });
  await showChecklist(today, { id: ID });
  await say('depth-mm', { 'depth-mm': ['20'], 'capacity-ml.unknown': ['on'] }, ['depth-mm', 'capacity-ml']);
  await showChecklist(today, { id: ID });
  await showChecklist(today, { id: ID });
  const result = await readResult(today, ID, null);
  if (!result.ok) throw new Error('The check is gone');
  expect(result.value.changes).toContainEqual({
    region: 'dk',
    rule: 'eu-pb-cat1',
    title: expect.any(String) as string,
    before: 'not-settled',
    after: 'applies',
  });
});

test('CHECK-49 a dated copy shows the same list for ever, judged from the editions it rested on', async () => {
  await begin(['dk']);
  await say('use', { use: ['food'] });
  const kept = await keepCheckCopy(today, { id: ID });
  if (!kept.ok) throw new Error('The check is gone');
  const hash = copyHash.parse(kept.value.hash);
  const first = await readCopy(today, hash, null);
  const later = await readCopy(at('2031-05-01T00:00:00Z'), hash, null);
  if (!first.ok || !later.ok) throw new Error('The copy is gone');
  expect(later.value.checklist).toEqual(first.value.checklist);
  expect(first.value.changes).toEqual([]);
  await expect(db('copies').where({ hash }).update({ document: '{}' })).rejects.toMatchObject({ errno: 1142 });
});
