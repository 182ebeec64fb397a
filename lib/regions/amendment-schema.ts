import { z } from 'zod';
import { tidyName } from '@/lib/accounts/domain/person-name';
import { calendarDate, regionCode } from '@/lib/kernel/shapes';
import { words } from '@/lib/kernel/words';
import type { AmendmentId } from './domain/amendment';
import { AMENDMENT_STATES } from './domain/amendment';
import { isItemKey } from './domain/sheet-items';

const key = z.uuid({ error: () => words('accounts.fault.form') });

export const amendmentId = z.uuid().transform((id) => id as AmendmentId);
const version = z.coerce.number().int().positive().max(4_000_000_000);
export const itemKey = z
  .string()
  .max(140)
  .refine(isItemKey, { error: () => words('amend.fault.item') });

/** A text of several lines: line ends made alike, blanks at both ends taken off. */
const longText = (least: number, most: number, empty: () => string) =>
  z
    .string({ error: empty })
    .max(most * 4, { error: () => words('amend.fault.long', { most }) })
    .transform((typed) => typed.normalize('NFC').replace(/\r\n?/g, '\n').trim())
    .pipe(
      z
        .string()
        .min(least, { error: empty })
        .max(most, { error: () => words('amend.fault.long', { most }) }),
    );

/** The name of a place: without marks that nobody sees or that turn the direction of reading. */
const placeName = z
  .string({ error: () => words('amend.fault.name') })
  .transform(tidyName)
  .pipe(longText(1, 80, () => words('amend.fault.name')));

export const SUMMARY_MOST = 500;
export const REASON_MOST = 2000;
const reason = longText(10, REASON_MOST, () => words('amend.fault.reason'));
const said = longText(1, REASON_MOST, () => words('amend.fault.words'));

/** What a form holds, as typed: by field name. Bounded before anything is made of it. */
export const entryValues = z
  .record(z.string().max(200), z.union([z.string().max(20_000), z.array(z.string().max(20_000)).max(400)]))
  .refine((values) => Object.keys(values).length <= 1000, { error: () => words('amend.fault.many') });
export type EntryValues = z.output<typeof entryValues>;

export const beginInput = z.strictObject({ key, region: regionCode });

/** A place that has no sheet yet. */
export const newPlaceInput = z.strictObject({
  key,
  region: regionCode,
  name: placeName,
  kind: z.enum(['bloc', 'country', 'part', 'standard'], { error: () => words('amend.fault.kind') }),
  languages: z
    .string()
    .transform((typed) => typed.split(/[\s,]+/).filter((lang) => lang !== ''))
    .pipe(z.array(z.string().regex(/^[a-z]{2,3}(-[A-Za-z0-9]{2,8})*$/, { error: () => words('amend.fault.languages') })).max(20)),
  parent: z.union([regionCode, z.literal('').transform(() => null)]).default(null),
  text: longText(1, 20_000, () => words('amend.fault.text')),
});

export const keepEntryInput = z.strictObject({
  id: amendmentId,
  item: itemKey,
  /** 0 where nothing was kept yet. */
  version: z.coerce.number().int().nonnegative().max(4_000_000_000),
  values: entryValues,
});
export const saveItemInput = z.strictObject({ ...keepEntryInput.shape, key });
export const itemInput = z.strictObject({ key, id: amendmentId, item: itemKey });
export const amendmentInput = z.strictObject({ key, id: amendmentId });
export const versionedInput = z.strictObject({ key, id: amendmentId, version });

export const sendInput = z.strictObject({
  key,
  id: amendmentId,
  version,
  summary: longText(10, SUMMARY_MOST, () => words('amend.fault.summary')),
  /** By trial id: why the other outcome is meant. */
  intended: z.record(z.string().max(100), z.string().max(2000)).default({}),
});

export const carryOverInput = z.strictObject({
  key,
  id: amendmentId,
  /** By the key of what collides: whose version is to stand. */
  choices: z.record(z.string().max(300), z.enum(['mine', 'now'])).default({}),
});

export const decisionInput = z.strictObject({ key, id: amendmentId, version, reason });
export const tickInput = z.strictObject({ key, id: amendmentId, version, claim: z.string().min(1).max(300), read: z.boolean() });
export const remarkInput = z.strictObject({ key, id: amendmentId, line: z.string().min(1).max(300), words: said });
export const remarkAnswerInput = z.strictObject({ key, id: amendmentId, remark: z.uuid(), words: said });
export const remarkDoneInput = z.strictObject({ key, id: amendmentId, remark: z.uuid(), answered: z.boolean() });
export const withdrawEditionInput = z.strictObject({ key, region: regionCode, number: version, reason });

const text = z.union([z.string(), z.array(z.string()).transform((all) => all[0] ?? '')]);

/** Of the sorting table's address: whatever cannot be read asks for nothing. */
export const waitingQuery = z.object({
  region: text.pipe(regionCode).optional().catch(undefined),
  state: text.pipe(z.enum(AMENDMENT_STATES)).optional().catch(undefined),
  /** Waiting for at least so many days. */
  days: text.transform(Number).pipe(z.int().min(0).max(3650)).optional().catch(undefined),
  /** Sent before this day. */
  until: text.pipe(calendarDate).optional().catch(undefined),
  sort: text
    .pipe(z.enum(['waiting', 'region', 'size']))
    .optional()
    .catch(undefined),
});

export type BeginInput = z.output<typeof beginInput>;
export type NewPlaceInput = z.output<typeof newPlaceInput>;
export type KeepEntryInput = z.output<typeof keepEntryInput>;
export type SaveItemInput = z.output<typeof saveItemInput>;
export type ItemInput = z.output<typeof itemInput>;
export type AmendmentInput = z.output<typeof amendmentInput>;
export type VersionedInput = z.output<typeof versionedInput>;
export type SendInput = z.output<typeof sendInput>;
export type CarryOverInput = z.output<typeof carryOverInput>;
export type DecisionInput = z.output<typeof decisionInput>;
export type TickInput = z.output<typeof tickInput>;
export type RemarkInput = z.output<typeof remarkInput>;
export type RemarkAnswerInput = z.output<typeof remarkAnswerInput>;
export type RemarkDoneInput = z.output<typeof remarkDoneInput>;
export type WithdrawEditionInput = z.output<typeof withdrawEditionInput>;
export type WaitingQuery = z.output<typeof waitingQuery>;
