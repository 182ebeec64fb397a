import 'server-only';
import { lockAccount, setRole } from '@/db/accounts';
import { writeDayBook } from '@/db/day-book';
import { enqueueMail } from '@/db/outbox';
import { deleteSessionsOf } from '@/db/sessions';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { writeMail } from '@/lib/server/mail-text';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { namesPerson } from './domain/public-reason';
import { judgeRoleChange, type RoleChange, type RoleChangeRefusal } from './domain/role-change';
import { holdStewards } from './hold-stewards';
import type { RoleChangeInput } from './steward-schema';

export type ChangeRoleRefusal = AccessRefusal | ChangeRefusal | RoleChangeRefusal | { readonly kind: 'not-found' | 'names-person' };
type Changed = { readonly id: string; readonly change: RoleChange };

/**
 * Grants a role or takes one away. The person's sessions end with it, so that no browser goes on under the earlier role; they get a
 * mail with the reason, and the day book a line.
 */
export async function changeRole(ctx: ActorCtx, input: RoleChangeInput): Promise<Result<Changed, ChangeRoleRefusal>> {
  const own = askSignedIn(ctx, 'role.grant');
  if (!own.ok) return own;
  const { key, id, from, role, reason } = input;
  const asked = { key, who: own.value.id, act: 'accounts.change-role', input: { id, from, role, reason } };
  return change(ctx, asked, async (trx): Promise<Result<Changed, ChangeRoleRefusal>> => {
    const stewards = await holdStewards(trx, own.value, 'role.grant');
    if (stewards === null) return err({ kind: 'not-allowed' });
    const account = await lockAccount(trx, id);
    if (account === null || account.email === null) return err({ kind: 'not-found' });
    const judged = judgeRoleChange(own.value.role, account, { from, to: role }, stewards);
    if (!judged.ok) return judged;
    if (namesPerson(reason, account.name)) return err({ kind: 'names-person' });
    await setRole(trx, id, role);
    await deleteSessionsOf(trx, id);
    const mail = writeMail('role-changed', { name: account.name, link: `${ctx.site}/bench`, role, reason });
    await enqueueMail(trx, { accountId: id, address: account.email, mail, kind: 'role-changed', at: ctx.now });
    await writeDayBook(trx, {
      actorId: own.value.id,
      did: `role.${judged.value}`,
      subject: { kind: 'account', id },
      reason,
      details: { from, to: role },
      at: ctx.now,
    });
    return ok({ id, change: judged.value });
  });
}
