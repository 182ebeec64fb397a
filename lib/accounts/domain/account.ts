import type { AccountId, AccountRole } from '@/lib/access/domain/actor';

/** `leaving`: asked to be deleted, can still be kept. `closed`: by a steward. `gone`: nothing of the person is left. */
export const ACCOUNT_STATES = ['unconfirmed', 'open', 'closed', 'leaving', 'gone'] as const;
export type AccountState = (typeof ACCOUNT_STATES)[number];

export const UNITS = ['metric', 'imperial'] as const;
export type Units = (typeof UNITS)[number];

export type Account = {
  readonly id: AccountId;
  /** Null once the account is gone. */
  readonly email: string | null;
  readonly name: string;
  readonly role: AccountRole;
  readonly state: AccountState;
  /** Goes up with every change of the row. */
  readonly version: number;
  readonly madeAt: Date;
  readonly confirmedAt: Date | null;
  /** When the 14 days of a leaving account are over. */
  readonly leavingAt: Date | null;
  readonly secondFactorOnAt: Date | null;
  readonly preferences: Preferences;
  readonly isDemo: boolean;
};

export type Preferences = { readonly region: string | null; readonly currency: string | null; readonly units: Units };

/** Whether somebody who knows the password may come in. A leaving account may, to be kept. */
export const mayEnter = (state: AccountState): boolean => state === 'open' || state === 'unconfirmed' || state === 'leaving';
