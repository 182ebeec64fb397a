import { randomUUID } from 'node:crypto';
import { insertAmendment } from '@/db/amendments';
import { db } from '@/db/connection';
import { findEdition } from '@/db/editions';
import { inTransaction } from '@/db/transaction';
import type { AccountId } from '@/lib/access/domain/actor';
import { ok } from '@/lib/kernel/result';
import { amendmentId } from '@/lib/regions/amendment-schema';
import { answerRemark } from '@/lib/regions/answer-remark';
import { beginAmendment } from '@/lib/regions/begin-amendment';
import { beginPlace } from '@/lib/regions/begin-place';
import { carryOver } from '@/lib/regions/carry-over';
import type { AmendmentId } from '@/lib/regions/domain/amendment';
import { emptySheet } from '@/lib/regions/domain/sheet-items';
import { dropEntry } from '@/lib/regions/drop-entry';
import { dropItem } from '@/lib/regions/drop-item';
import { keepEntry } from '@/lib/regions/keep-entry';
import { reopenAmendment } from '@/lib/regions/reopen-amendment';
import { restoreItem } from '@/lib/regions/restore-item';
import { saveItem } from '@/lib/regions/save-item';
import { sendAmendment } from '@/lib/regions/send-amendment';
import { takeBackAmendment } from '@/lib/regions/take-back-amendment';
import { withdrawAmendment } from '@/lib/regions/withdraw-amendment';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { newId } from '@/lib/server/new-id';
import { foundPlaces } from './sent-amendments';
import { aSheet } from './small-world';

const ACTIONS = 'app/(workshop)/bench/amendments/actions.ts';
const PLACE = 'xa';

/** A draft of that person's to an invented place, as it was begun. */
async function aDraft(author: AccountId): Promise<string> {
  await foundPlaces([{ ...emptySheet('care', 'Care', 'base'), text: 'For every place.' }, aSheet(PLACE)]);
  const base = await findEdition(db, PLACE, 1);
  if (base === null) throw new Error(`There is no sheet of ${PLACE}`);
  const id = amendmentId.parse(newId(new Date()));
  await inTransaction(db, async (trx) => {
    await insertAmendment(trx, { id, region: PLACE, authorId: author, baseNumber: 1, document: base.sheet, at: new Date() });
    return ok(null);
  });
  return id;
}

/** Keyed and named as a form sends it. */
const of = (record: string): { readonly key: string; readonly id: AmendmentId } => ({ key: randomUUID(), id: record as AmendmentId });

type End = { readonly ok: true } | { readonly ok: false; readonly error: { readonly kind: string } };
type Press = (who: { readonly ctx: ActorCtx }, record: string) => Promise<End>;

/** A door as the matrix of roles has it. */
type Door = {
  readonly asks: 'amendment.write';
  readonly record?: (whose: AccountId) => Promise<string>;
  readonly press: Press;
  readonly ends: Partial<Readonly<Record<'own' | 'other' | 'none', string>>>;
};

/** A door to one's own draft: for anybody else, moderators too, it is not there (S28). */
const ofDraft = (own: string, press: Press): Door => ({
  asks: 'amendment.write',
  record: aDraft,
  press,
  ends: { own, other: 'not-found', none: 'not-found' },
});

const kept = { item: 'gaps' as const, version: 0, values: { gaps: 'We have not found the mark.' } };

/** The doors of an author to their own amendments. */
export const DRAFT_DOORS: Readonly<Record<string, Door>> = {
  [`${ACTIONS} typed`]: ofDraft('ok, nothing', ({ ctx }, record) => saveItem(ctx, { ...of(record), ...kept })),
  [`${ACTIONS} begin`]: {
    asks: 'amendment.write',
    press: ({ ctx }) => beginAmendment(ctx, { key: randomUUID(), region: 'zz' }),
    ends: { own: 'no-sheet' },
  },
  [`${ACTIONS} beginNewPlace`]: {
    asks: 'amendment.write',
    press: ({ ctx }) =>
      beginPlace(ctx, { key: randomUUID(), region: 'zz', name: 'Nowhere', kind: 'country', languages: [], parent: null, text: 'tests' }),
    ends: { own: 'ok, nothing' },
  },
  [`${ACTIONS} add`]: ofDraft('ok, nothing', ({ ctx }, record) => keepEntry(ctx, { id: of(record).id, ...kept })),
  [`${ACTIONS} drop`]: ofDraft('ok, nothing', ({ ctx }, record) => dropItem(ctx, { ...of(record), item: 'trials/none' })),
  [`${ACTIONS} restore`]: ofDraft('ok, nothing', ({ ctx }, record) => restoreItem(ctx, { ...of(record), item: 'gaps' })),
  [`${ACTIONS} throwAway`]: ofDraft('ok, nothing', ({ ctx }, record) => dropEntry(ctx, { ...of(record), item: 'gaps' })),
  [`${ACTIONS} takeBack`]: ofDraft('already-decided', ({ ctx }, record) => takeBackAmendment(ctx, of(record))),
  [`${ACTIONS} withdraw`]: ofDraft('ok, nothing', ({ ctx }, record) => withdrawAmendment(ctx, of(record))),
  [`${ACTIONS} reopen`]: ofDraft('already-decided', ({ ctx }, record) => reopenAmendment(ctx, of(record))),
  [`${ACTIONS} carry`]: ofDraft('not-stale', ({ ctx }, record) => carryOver(ctx, { ...of(record), choices: {} })),
  [`${ACTIONS} attachPage`]: ofDraft('ok, nothing', ({ ctx }, record) => keepEntry(ctx, { id: of(record).id, ...kept })),
  [`${ACTIONS} send`]: ofDraft('nothing-changed', ({ ctx }, record) =>
    sendAmendment(ctx, { ...of(record), version: 1, summary: 'Sent by the tests.', intended: {} }),
  ),
  [`${ACTIONS} answer`]: ofDraft('not-found', ({ ctx }, record) =>
    answerRemark(ctx, { ...of(record), remark: randomUUID(), words: 'tests' }),
  ),
  'app/api/entries/route.ts POST': ofDraft('ok, nothing', ({ ctx }, record) => keepEntry(ctx, { id: of(record).id, ...kept })),
};
