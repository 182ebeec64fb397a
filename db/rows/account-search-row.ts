import { z } from 'zod';
import type { AccountId, AccountRole } from '@/lib/access/domain/actor';
import type { AccountState } from '@/lib/accounts/domain/account';
import { accountRow } from './account-row';

/** An account as far as others may read of it. */
export type NamedAccount = { readonly id: AccountId; readonly name: string; readonly role: AccountRole; readonly state: AccountState };

export const namedRow = z
  .object({ id: z.string(), name: z.string(), role: accountRow.in.shape.role, state: accountRow.in.shape.state })
  .transform((row): NamedAccount => ({ ...row, id: row.id as AccountId }));
