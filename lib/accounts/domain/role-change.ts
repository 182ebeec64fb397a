import { rankOf, type AccountId, type AccountRole } from '@/lib/access/domain/actor';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { AccountState } from './account';

/** An account as far as it decides what may become of its role. */
export type Holder = { readonly id: AccountId; readonly role: AccountRole; readonly state: AccountState };

export type RoleChange = 'grant' | 'take';

/**
 * `changed-meanwhile`: the role is not the one the form was drawn for. `too-high`: above the role of whoever acts. `not-open`: nobody
 * can come in with that account. `last-steward`: nobody would be left to run the place.
 */
export type RoleChangeRefusal = { readonly kind: 'changed-meanwhile' | 'same-role' | 'too-high' | 'not-open' | 'last-steward' };

export type Wanted = { readonly from: AccountRole; readonly to: AccountRole };

/** Whether the role of `holder` may be changed by somebody with the role `by`. `stewards` counts those who can sign in, the holder included. */
export function judgeRoleChange(by: AccountRole, holder: Holder, wanted: Wanted, stewards: number): Result<RoleChange, RoleChangeRefusal> {
  if (holder.role !== wanted.from) return err({ kind: 'changed-meanwhile' });
  if (wanted.to === holder.role) return err({ kind: 'same-role' });
  if (Math.max(rankOf(wanted.to), rankOf(holder.role)) > rankOf(by)) return err({ kind: 'too-high' });
  const isGrant = rankOf(wanted.to) > rankOf(holder.role);
  if (isGrant && holder.state !== 'open') return err({ kind: 'not-open' });
  if (isLastSteward(holder, stewards)) return err({ kind: 'last-steward' });
  return ok(isGrant ? 'grant' : 'take');
}

export type ClosingRefusal = {
  readonly kind: 'own-account' | 'too-high' | 'closed-already' | 'leaving' | 'last-steward' | 'not-found';
};

/** Whether an account may be closed by `by`. One's own is deleted on the bench instead; one that is leaving goes by itself. */
export function judgeClosing(by: Pick<Holder, 'id' | 'role'>, holder: Holder, stewards: number): Result<null, ClosingRefusal> {
  if (holder.state === 'gone') return err({ kind: 'not-found' });
  if (holder.id === by.id) return err({ kind: 'own-account' });
  if (rankOf(holder.role) > rankOf(by.role)) return err({ kind: 'too-high' });
  if (holder.state === 'closed') return err({ kind: 'closed-already' });
  if (holder.state === 'leaving') return err({ kind: 'leaving' });
  return isLastSteward(holder, stewards) ? err({ kind: 'last-steward' }) : ok(null);
}

const isLastSteward = ({ role, state }: Holder, stewards: number): boolean => role === 'steward' && state === 'open' && stewards <= 1;
