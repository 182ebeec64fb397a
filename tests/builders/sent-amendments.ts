import { insertAmendment, updateAmendment } from '@/db/amendments';
import { insertRemark } from '@/db/amendment-remarks';
import { db } from '@/db/connection';
import { findEdition, findNumberInUse, publishEdition } from '@/db/editions';
import { putRegion, replaceMemberships } from '@/db/regions';
import { inTransaction } from '@/db/transaction';
import type { AccountId } from '@/lib/access/domain/actor';
import { ok } from '@/lib/kernel/result';
import { amendmentId } from '@/lib/regions/amendment-schema';
import type { AmendmentId, AmendmentState } from '@/lib/regions/domain/amendment';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { emptySheet } from '@/lib/regions/domain/sheet-items';
import { newId } from '@/lib/server/new-id';
import { aRule, aSheet } from './small-world';

type Put = {
  readonly region: string;
  readonly baseNumber: number | null;
  readonly document: Sheet;
  readonly summary: string;
  readonly state?: AmendmentState;
  readonly at?: Date;
};

/** Puts an amendment in as its author sent it, past forms and checks. It is at version 2. */
export async function putSent(author: AccountId, { summary, state = 'sent', at = new Date(), ...draft }: Put): Promise<AmendmentId> {
  const id = amendmentId.parse(newId(at));
  await inTransaction(db, async (trx) => {
    await insertAmendment(trx, { id, authorId: author, at, ...draft });
    await updateAmendment(trx, id, 1, { state, summary, sentAt: at, at });
    return ok(null);
  });
  return id;
}

/** An amendment to the sheet in use of a place. */
export async function sendChanged(
  author: AccountId,
  region: string,
  { mend, summary }: { readonly mend: (sheet: Sheet) => Sheet; readonly summary: string },
): Promise<AmendmentId> {
  const number = await findNumberInUse(db, region);
  const base = number === null ? null : await findEdition(db, region, number);
  if (base === null) throw new Error(`There is no sheet of ${region}`);
  return putSent(author, { region, baseNumber: base.number, document: mend(base.sheet), summary });
}

/** Places without neighbours, put in where they are not there yet. */
export async function foundPlaces(sheets: readonly Sheet[]): Promise<void> {
  for (const sheet of sheets) {
    const { code, name, kind, memberships } = sheet;
    if ((await findNumberInUse(db, code)) !== null) continue;
    await inTransaction(db, async (trx) => {
      await putRegion(trx, { code, name, kind });
      await publishEdition(trx, 1, { sheet, origin: 'seed', summary: 'Founding sheet', at: new Date('2026-01-01T00:00:00Z') });
      await replaceMemberships(trx, code, memberships);
      return ok(null);
    });
  }
}

const PLACE = 'xa';

/** A sent amendment of that person to an invented place, and a remark of theirs on it. Its id, then that of the remark. */
export async function aSentAmendment(author: AccountId): Promise<string> {
  await foundPlaces([{ ...emptySheet('care', 'Care', 'base'), text: 'For every place.' }, aSheet(PLACE)]);
  const mend = (sheet: Sheet): Sheet => ({ ...sheet, rules: [...sheet.rules, aRule('xa-mark')] });
  const id = await sendChanged(author, PLACE, { mend, summary: 'A mark is wanted as well.' });
  const remark = newId(new Date());
  await inTransaction(db, async (trx) => {
    const said = { id: remark, answerTo: null, line: 'rules/xa-mark', words: 'Which mark?', authorId: author, at: new Date() };
    await insertRemark(trx, id, said);
    return ok(null);
  });
  return `${id} ${remark}`;
}
