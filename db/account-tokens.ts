import type { Knex } from 'knex';
import type { AccountId } from '@/lib/access/domain/actor';
import type { TokenKind } from '@/lib/accounts/domain/session-age';
import { tokenRow, type SpentToken } from './rows/account-row';
import type { Trx } from './transaction';

export type NewToken = {
  /** SHA-256 of the token in the mailed link. */
  readonly hash: Buffer;
  readonly accountId: AccountId;
  readonly kind: TokenKind;
  /** The new address, for a change of address. */
  readonly email: string | null;
  readonly at: Date;
  readonly endsAt: Date;
};

/** Puts a token in the place of any earlier one of its kind, which is of no use from now on. */
export async function putToken(trx: Trx, { hash, accountId, kind, email, at, endsAt }: NewToken): Promise<void> {
  await trx('account_tokens')
    .insert({ hash, account_id: accountId, kind, email, made_at: at, ends_at: endsAt })
    .onConflict()
    .merge(['hash', 'email', 'made_at', 'ends_at']);
}

/** Whose token that is, while it can be used. Reading it spends nothing. */
export async function findToken(db: Knex, hash: Buffer, kind: TokenKind, now: Date): Promise<SpentToken | null> {
  const row: unknown = await db('account_tokens').where({ hash, kind }).where('ends_at', '>', now).select('account_id', 'email').first();
  return row === undefined ? null : tokenRow.parse(row);
}

/** Takes the token out, so that of any number who come with it one gets it. Null for all others, and when its time is over. */
export async function spendToken(trx: Trx, hash: Buffer, kind: TokenKind, now: Date): Promise<SpentToken | null> {
  const row: unknown = await trx('account_tokens')
    .where({ hash, kind })
    .where('ends_at', '>', now)
    .select('account_id', 'email')
    .forUpdate()
    .first();
  if (row === undefined) return null;
  return (await trx('account_tokens').where({ hash, kind }).del()) === 1 ? tokenRow.parse(row) : null;
}

/** No link that was mailed before is of use after this. */
export async function deleteTokensOf(trx: Trx, accountId: AccountId): Promise<void> {
  await trx('account_tokens').where({ account_id: accountId }).del();
}

/** Deletes up to `most` tokens whose time was over at `now`. */
export async function deleteEndedTokens(db: Knex, now: Date, most: number): Promise<number> {
  return db('account_tokens').where('ends_at', '<=', now).limit(most).del();
}
