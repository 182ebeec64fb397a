import 'server-only';
import { searchAccounts } from '@/db/account-search';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import type { Account } from './domain/account';
import type { AccountSearch } from './steward-schema';

const AT_A_TIME = 50;

export type FoundAccounts = {
  readonly accounts: readonly Account[];
  /** The id after which the next page begins; null on the last one. */
  readonly next: string | null;
};

/** Accounts by a part of their name or address, for stewards: the newest first, fifty at a time. */
export async function listAccounts(ctx: ActorCtx, { q, role, after }: AccountSearch): Promise<Result<FoundAccounts, AccessRefusal>> {
  const own = askSignedIn(ctx, 'account.look-up');
  if (!own.ok) return own;
  const found = await searchAccounts(ctx.db, { words: q, role, after, limit: AT_A_TIME + 1 });
  const accounts = found.slice(0, AT_A_TIME);
  return ok({ accounts, next: found.length > AT_A_TIME ? (accounts.at(-1)?.id ?? null) : null });
}
