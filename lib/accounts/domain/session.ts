import type { AccountId, AccountRole } from '@/lib/access/domain/actor';
import type { AccountState } from './account';

/** A session's row joined with its account, as it is read at every request. */
export type FoundSession = {
  readonly accountId: AccountId;
  readonly name: string;
  readonly role: AccountRole;
  readonly state: AccountState;
  readonly confirmed: boolean;
  readonly secondFactorOn: boolean;
  readonly secondFactorAt: Date | null;
  readonly freshAt: Date;
  readonly seenAt: Date;
  readonly madeAt: Date;
  readonly endsAt: Date;
};

/** A line of one's own list of sessions. `handle` names it in a form; it is not its secret. */
export type ListedSession = {
  readonly handle: string;
  readonly agent: string;
  readonly madeAt: Date;
  readonly seenAt: Date;
  readonly endsAt: Date;
  readonly here: boolean;
};
