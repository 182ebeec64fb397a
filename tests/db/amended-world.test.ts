import { beforeAll, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { listMemberships, listRegions } from '@/db/regions';
import { buildChecklist } from '@/lib/checks/build-checklist';
import { checkProposal } from '@/lib/regions/check-proposal';
import { beginPlace } from '@/lib/regions/begin-place';
import { newPlaceInput } from '@/lib/regions/amendment-schema';
import { compareProposal } from '@/lib/regions/compare-proposal';
import type { Rule } from '@/lib/regions/domain/rule';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { sendAmendment } from '@/lib/regions/send-amendment';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { aDate, seedSheets } from '../builders/seed-sheets';
import { key, later } from './account-people';
import { aDraft, approve, putDraft, readAll, someone, SUMMARY, value } from './amendment-people';
import { foundSheets } from './founding';

const TODAY = aDate('2026-12-01');
let author: ActorCtx;
let mo: ActorCtx;
let ada: ActorCtx;
const ctx = () => ({ db, now: new Date() });

beforeAll(async () => {
  await foundSheets();
  // Founding sheets come into use at the real instant; these people come a day later.
  const tomorrow = later(86_400_000);
  [author, mo, ada] = [
    await someone('editor', 'Ida', tomorrow),
    await someone('moderator', 'Mo', tomorrow),
    await someone('moderator', 'Ada', tomorrow),
  ];
});

const timed = async <T>(what: string, work: () => Promise<T>): Promise<T> => {
  const start = performance.now();
  const done = await work();
  console.log(`${what}: ${(performance.now() - start).toFixed(0)} ms`);
  return done;
};

/** The sheet with that limit at another figure, quoted. */
const withLimit = (sheet: Sheet, id: string, figure: number): Sheet => ({
  ...sheet,
  rules: sheet.rules.map((rule): Rule => {
    if (rule.id !== id || rule.payload.topic !== 'limit') return rule;
    const [first, ...rest] = rule.sources;
    const quoted = first === undefined ? [] : [{ ...first, passage: 'The limit shall be otherwise.', passageLang: 'en' }];
    const payload = { ...rule.payload, amount: { ...rule.payload.amount, value: figure } };
    return { ...rule, payload, sources: [...quoted, ...rest] };
  }),
});

const limitIn = async (region: string): Promise<unknown> => {
  const asked = { regions: [region], on: aDate('2026-12-02'), answers: { use: 'food', 'holds-liquid': true }, declined: [], keep: false };
  const list = value(await buildChecklist({ db, now: later(2 * 86_400_000) }, asked));
  return list.regions[0]?.editions['eu'];
};

test('REG-56 a changed limit of the EU is in the lists of the places below it at the next request', async () => {
  const eu = seedSheets.get('eu');
  if (eu === undefined) throw new Error('no sheet of the EU');
  for (const code of ['eu', 'de', 'dk']) {
    const sheet = seedSheets.get(code);
    const document = { ...sheet, rules: sheet?.rules.map((rule) => ({ ...rule, says: `${rule.says} Measured.` })) };
    await timed(`check of ${code}`, () => checkProposal(ctx(), { code, document, base: 1, on: TODAY }));
    await timed(`check of ${code} again`, () => checkProposal(ctx(), { code, document, base: 1, on: TODAY }));
  }
  const document = withLimit(eu, 'eu-pb-cat2', 1.5);
  await timed('comparison of eu', () => compareProposal(ctx(), { region: 'eu', base: 1, document, summary: '' }));
  const id = await putDraft(author, { region: 'eu', baseNumber: 1, document });
  const sending = { id, summary: SUMMARY, intended: {} };
  const { version } = value(await timed('send', () => sendAmendment(author, { ...sending, key: key(), version: 1 })));
  await readAll(mo, id);
  expect(value(await timed('first approval', () => approve(mo, id, version)))).toEqual({ outcome: 'once-approved' });
  await readAll(ada, id);
  expect(await Promise.all(['eu', 'de', 'dk'].map(limitIn))).toEqual([1, 1, 1]);
  expect(value(await timed('approval', () => approve(ada, id, version + 1)))).toEqual({ outcome: 'in-use', region: 'eu', edition: 2 });
  expect(await Promise.all(['eu', 'de', 'dk'].map(limitIn))).toEqual([2, 2, 2]);
}, 120_000);

test('REG-19 a sheet that people amended keeps its name, kind and layers when the seeds are put in again', async () => {
  const id = await aDraft(author, 'dk', (sheet) => ({ ...sheet, name: 'Danmark', memberships: [] }));
  const trials = seedSheets.get('dk')?.trials ?? [];
  const intended = Object.fromEntries(trials.map((trial) => [trial.id, 'It leaves, in this test.']));
  const sent = await sendAmendment(author, { key: key(), id, version: 1, summary: SUMMARY, intended });
  // Without its layers Denmark's own rules would rest on nothing: the checks keep that from coming into use.
  expect(sent).toMatchObject({ ok: false, error: { kind: 'findings' } });
  const renamed = await aDraft(author, 'dk', (sheet) => ({
    ...sheet,
    name: 'Danmark',
    memberships: sheet.memberships.map((edge) => ({ ...edge, from: aDate('1973-01-02') })),
  }));
  const { version } = value(await sendAmendment(author, { key: key(), id: renamed, version: 1, summary: SUMMARY, intended }));
  value(await approve(mo, renamed, version));
  value(await approve(ada, renamed, version + 1));
  const place = newPlaceInput.parse({ key: key(), region: 'ad', name: 'Andorra la Vella', kind: 'country', languages: 'ca', text: 'New.' });
  const fresh = value(await beginPlace(author, place)).id;
  const first = value(await sendAmendment(author, { key: key(), id: fresh, version: 1, summary: SUMMARY, intended: {} }));
  let approved = value(await approve(mo, fresh, first.version));
  if (approved.outcome === 'once-approved') approved = value(await approve(ada, fresh, first.version + 1));
  expect(approved).toEqual({ outcome: 'in-use', region: 'ad', edition: 1 });

  const before = await listMemberships(db);
  await foundSheets();
  expect(await listMemberships(db)).toEqual(before);
  expect(before.get('dk')?.every(({ from }) => from === '1973-01-02')).toBe(true);
  const regions = new Map((await listRegions(db)).map((region) => [region.code, region]));
  expect(regions.get('dk')).toMatchObject({ name: 'Danmark', edition: 2 });
  expect(regions.get('ad')).toMatchObject({ name: 'Andorra la Vella', edition: 1 });
}, 120_000);
