import { z } from 'zod';
import { ROLES, type AccountRole } from '@/lib/access/domain/actor';
import { words } from '@/lib/kernel/words';
import { accountId } from './schema';

const key = z.uuid({ error: () => words('accounts.fault.form') });

const role = z.enum(
  ROLES.filter((one): one is AccountRole => one !== 'reader'),
  { error: () => words('stewards.fault.role') },
);

/** A text of several lines that has to be there. */
const longText = (most: number, empty: () => string, long: () => string) =>
  z
    .string({ error: empty })
    .max(most * 4, { error: long })
    .transform((typed) => typed.normalize('NFC').replace(/\r\n?/g, '\n').trim())
    .pipe(z.string().min(1, { error: empty }).max(most, { error: long }));

const REASON_MOST = 500;
const reason = longText(
  REASON_MOST,
  () => words('stewards.fault.reason.empty'),
  () => words('stewards.fault.reason.long'),
);

export const roleChangeInput = z.strictObject({ key, id: accountId, from: role, role, reason });
export const closingInput = z.strictObject({ key, id: accountId, reason });

const ANSWER_MOST = 2000;
export const answerInput = z.strictObject({
  key,
  id: z.uuid(),
  answer: z.enum(['granted', 'refused'], { error: () => words('stewards.fault.answer.none') }),
  said: longText(
    ANSWER_MOST,
    () => words('stewards.fault.answer.empty'),
    () => words('stewards.fault.answer.long'),
  ),
});

export const requestId = z.uuid();

const LONGEST_SEARCH = 200;
const text = z.union([z.string(), z.array(z.string()).transform((all) => all[0] ?? '')]);

/** Of the list's address: whatever cannot be read asks for nothing. */
export const accountSearch = z.object({
  q: text
    .transform((typed) => typed.normalize('NFC').trim().slice(0, LONGEST_SEARCH))
    .optional()
    .catch(undefined),
  role: role.optional().catch(undefined),
  after: accountId.optional().catch(undefined),
});

export type RoleChangeInput = z.output<typeof roleChangeInput>;
export type ClosingInput = z.output<typeof closingInput>;
export type AnswerInput = z.output<typeof answerInput>;
export type AccountSearch = z.output<typeof accountSearch>;
