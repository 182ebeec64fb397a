import { beforeAll, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { findEdition, findNumberInUse } from '@/db/editions';
import { answerRemark } from '@/lib/regions/answer-remark';
import { addRemark } from '@/lib/regions/add-remark';
import { beginAmendment } from '@/lib/regions/begin-amendment';
import { keepEntry } from '@/lib/regions/keep-entry';
import { itemOf, keyIn, type ItemKey } from '@/lib/regions/domain/sheet-items';
import { dropEntry } from '@/lib/regions/drop-entry';
import { dropItem } from '@/lib/regions/drop-item';
import { writeItem } from '@/lib/regions/item-form';
import { listWaiting } from '@/lib/regions/list-waiting';
import { openForReview } from '@/lib/regions/open-for-review';
import { readDraft } from '@/lib/regions/read-draft';
import { restoreItem } from '@/lib/regions/restore-item';
import { saveItem } from '@/lib/regions/save-item';
import { sendAmendment } from '@/lib/regions/send-amendment';
import { aSheet, putWorld } from '../builders/small-world';
import { key, mailsOf } from './account-people';
import { approve, idOf, readAll, someone, SUMMARY, value } from './amendment-people';

beforeAll(() => putWorld([aSheet('xa'), aSheet('xb'), aSheet('xc')]));

const linesOf = async (id: string): Promise<readonly unknown[]> => db('day_book').where({ subject_id: id }).orderBy('number').pluck('did');

test('REG-51 REG-56 an amendment goes from the form to the edition in use, with one decision, one mail and one line of the day book', async () => {
  const [author, moderator] = [await someone('editor', 'Ida'), await someone('moderator', 'Mo')];
  const { id } = value(await beginAmendment(author, { key: key(), region: 'xa' }));
  const draft = value(await readDraft(author, { id }));
  expect(draft).toMatchObject({ name: 'Land of xa', changed: [], entries: [], stale: null });
  const rule = itemOf(draft.document, 'rules/xa-name');
  if (rule === null) throw new Error('no rule');
  const typed = { ...writeItem(rule), says: 'Sellers give their name and address on request.' };
  const kept = value(await keepEntry(author, { id, item: 'rules/xa-name', version: 0, values: typed }));
  expect(value(await keepEntry(author, { id, item: 'rules/xa-name', version: 0, values: typed }))).toEqual(kept);
  const sending = { id, summary: SUMMARY, intended: {} };
  expect(await sendAmendment(author, { ...sending, key: key(), version: 1 })).toMatchObject({ ok: false, error: { kind: 'unfinished' } });
  expect(value(await saveItem(author, { key: key(), id, item: 'rules/xa-name', ...kept, values: typed }))).toEqual({
    saved: true,
    item: 'rules/xa-name',
  });
  const changed = value(await readDraft(author, { id }));
  expect(changed).toMatchObject({ entries: [], changed: [{ item: 'rules/xa-name', change: 'changed' }], amendment: { version: 2 } });
  const once = key();
  expect(value(await sendAmendment(author, { ...sending, key: once, version: 2 }))).toEqual({ version: 3 });
  expect(value(await sendAmendment(author, { ...sending, key: once, version: 2 }))).toEqual({ version: 3 });

  const rows = value(await listWaiting(moderator, {}));
  expect(rows).toMatchObject([{ id, region: 'xa', rules: 1, items: 1, needed: 1, given: 0, isOwn: false, isStale: false }]);
  const review = value(await openForReview(moderator, { id }));
  expect(review).toMatchObject({ author: 'Ida', claims: [{ key: 'rules/xa-name#0', isRead: false }], needed: 1, openElsewhere: null });
  expect(review.comparison.items).toMatchObject([{ list: 'rules', id: 'xa-name', change: 'changed' }]);
  expect(await approve(moderator, id, 3)).toMatchObject({ ok: false, error: { kind: 'not-all-read', claims: ['rules/xa-name#0'] } });
  const remark = value(await addRemark(moderator, { key: key(), id, line: 'rules/xa-name', words: 'Which address?' }));
  value(await answerRemark(author, { key: key(), id, remark: remark.id, words: 'That of the workshop.' }));
  await readAll(moderator, id);
  expect(value(await approve(moderator, id, 3))).toEqual({ outcome: 'in-use', region: 'xa', edition: 2 });

  expect(await findNumberInUse(db, 'xa')).toBe(2);
  expect(await findEdition(db, 'xa', 2)).toMatchObject({ origin: 'amendment', summary: SUMMARY, sheet: { rules: [{ says: typed.says }] } });
  expect(await linesOf(id)).toEqual(['amendment.send', 'amendment.approve']);
  const mails = await mailsOf('amendment-decided');
  expect(mails).toHaveLength(1);
  expect(mails[0]?.body_text).toContain('as edition 2');
  const read = value(await readDraft(author, { id }));
  expect(read).toMatchObject({
    amendment: { state: 'in-use', editionNumber: 2 },
    decisions: [{ kind: 'approve', by: 'Mo', version: 3 }],
    remarks: [{ by: 'Mo', words: 'Which address?', answers: [{ by: 'Ida' }] }],
  });
  expect(idOf(author)).toBe(read.amendment.authorId);
  expect(await approve(await someone('moderator'), id, 3)).toMatchObject({
    ok: false,
    error: { kind: 'already-decided', state: 'in-use', by: 'Mo' },
  });
});

test('REG-62 REG-57 what cannot be read comes back with its faults and is kept; dropped, it is never taken for what follows', async () => {
  const author = await someone('editor');
  const { id } = value(await beginAmendment(author, { key: key(), region: 'xb' }));
  const item = 'rules/xb-fresh' as const;
  const values = { title: 'A fresh rule' };
  const saved = value(await saveItem(author, { key: key(), id, item, version: 0, values }));
  if (saved.saved) throw new Error('It was taken for a rule');
  expect(Object.keys(saved.faults)).toContain('says');
  expect(value(await readDraft(author, { id }))).toMatchObject({ entries: [{ item, values, version: saved.version }], changed: [] });
  value(await dropEntry(author, { key: key(), id, item }));
  const again = value(await keepEntry(author, { id, item, version: 0, values }));
  expect(again.version).toBeGreaterThan(saved.version);
  expect(await keepEntry(author, { id, item, version: saved.version, values: { title: 'Of another tab' } })).toEqual({
    ok: false,
    error: { kind: 'entry-moved-on', version: again.version, values },
  });
});

test('REG-62 a rule is withdrawn and put back, a cited source stays, and contacts move up with what was typed for them', async () => {
  const author = await someone('editor');
  const { id } = value(await beginAmendment(author, { key: key(), region: 'xc' }));
  const act = (item: ItemKey) => ({ key: key(), id, item });
  expect(await dropItem(author, act('sources/xa-text'))).toEqual({ ok: false, error: { kind: 'still-cited', items: ['rules/xc-name'] } });
  expect(await dropItem(author, act('text'))).toEqual({ ok: false, error: { kind: 'cannot-drop' } });
  value(await dropItem(author, act('rules/xc-name')));
  value(await dropItem(author, act('sources/xa-text')));
  expect(value(await readDraft(author, { id })).changed).toMatchObject([
    { item: 'rules/xc-name', change: 'withdrawn' },
    { item: 'sources/xa-text', change: 'withdrawn' },
  ]);
  expect(await restoreItem(author, act('rules/xc-name'))).toMatchObject({ ok: false, error: { kind: 'does-not-fit' } });
  value(await restoreItem(author, act('sources/xa-text')));
  value(await restoreItem(author, act('rules/xc-name')));
  expect(value(await readDraft(author, { id }))).toMatchObject({ changed: [] });

  for (const place of ['1', '2']) {
    const contact = { name: `Office ${place}`, url: null, role: 'Answers', evidence: 'read' } as const;
    const values = writeItem({ list: 'authorities', value: contact });
    const saved = value(await saveItem(author, { key: key(), id, item: keyIn('authorities', place), version: 0, values }));
    expect(saved).toEqual({ saved: true, item: `authorities/${place}` });
  }
  value(await keepEntry(author, { id, item: 'authorities/2', version: 0, values: { name: 'Office two' } }));
  value(await dropItem(author, act('authorities/1')));
  const draft = value(await readDraft(author, { id }));
  expect(draft.document.authorities).toMatchObject([{ name: 'Office 2' }]);
  expect(draft.entries).toMatchObject([{ item: 'authorities/1', values: { name: 'Office two' } }]);
});
