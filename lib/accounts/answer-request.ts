import 'server-only';
import { lockAccount, setRole } from '@/db/accounts';
import { writeDayBook } from '@/db/day-book';
import { enqueueMail } from '@/db/outbox';
import { endRoleRequest, lockRoleRequest } from '@/db/role-requests';
import { deleteSessionsOf } from '@/db/sessions';
import type { Trx } from '@/db/transaction';
import type { SignedIn } from '@/lib/access/domain/actor';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import type { DayBookEntry } from '@/lib/day-book/domain/entry';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { writeMail } from '@/lib/server/mail-text';
import type { Account } from './domain/account';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { judgeRoleChange, type RoleChangeRefusal } from './domain/role-change';
import { holdStewards } from './hold-stewards';
import type { AnswerInput } from './steward-schema';

export type AnswerRefusal = AccessRefusal | ChangeRefusal | RoleChangeRefusal | { readonly kind: 'not-found' | 'answered' };

/**
 * Answers a maker who asked to become an editor. The words go to the maker alone; the day book says only that a request was answered,
 * and how. Granting it is a change of role like any other.
 */
export async function answerRequest(ctx: ActorCtx, input: AnswerInput): Promise<Result<null, AnswerRefusal>> {
  const own = askSignedIn(ctx, 'role.answer');
  if (!own.ok) return own;
  const { key, id, answer, said } = input;
  const asked = { key, who: own.value.id, act: 'accounts.answer-request', input: { id, answer, said } };
  return change(ctx, asked, async (trx): Promise<Result<null, AnswerRefusal>> => {
    const stewards = await holdStewards(trx, own.value, 'role.answer');
    if (stewards === null) return err({ kind: 'not-allowed' });
    const account = await lockAsker(trx, id);
    if (account === null || account.email === null) return err({ kind: 'not-found' });
    const end = { state: answer, answer: said, answeredBy: own.value.id, at: ctx.now };
    if (!(await endRoleRequest(trx, id, end))) return err({ kind: 'answered' });
    const made = answer === 'granted' ? await makeEditor(trx, own.value, account, stewards) : ok(null);
    if (!made.ok) return made;
    const mail = writeMail('role-answer', { name: account.name, link: `${ctx.site}/bench`, answer, reason: said });
    await enqueueMail(trx, { accountId: account.id, address: account.email, mail, kind: 'role-answer', at: ctx.now });
    const told = answer === 'granted' ? granted(account) : { did: 'role.refuse', subject: { kind: 'role-request', id }, details: {} };
    await writeDayBook(trx, { ...told, actorId: own.value.id, reason: null, at: ctx.now });
    return ok(null);
  });
}

async function lockAsker(trx: Trx, requestId: string): Promise<Account | null> {
  const request = await lockRoleRequest(trx, requestId);
  return request === null ? null : lockAccount(trx, request.accountId);
}

const granted = ({ id }: Account): Pick<DayBookEntry, 'did' | 'subject' | 'details'> => ({
  did: 'role.grant',
  subject: { kind: 'account', id },
  details: { from: 'maker', to: 'editor', asked: true },
});

async function makeEditor(trx: Trx, by: SignedIn, account: Account, stewards: number): Promise<Result<null, RoleChangeRefusal>> {
  const judged = judgeRoleChange(by.role, account, { from: 'maker', to: 'editor' }, stewards);
  if (!judged.ok) return judged;
  await setRole(trx, account.id, 'editor');
  await deleteSessionsOf(trx, account.id);
  return ok(null);
}
