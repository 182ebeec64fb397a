import type { Knex } from 'knex';
import type { AccountId, AccountRole } from '@/lib/access/domain/actor';
import type { Account, AccountState, Preferences } from '@/lib/accounts/domain/account';
import { accountRow, secretsRow, type AccountSecrets } from './rows/account-row';
import type { Trx } from './transaction';

const OPENLY = [
  'id',
  'email',
  'name',
  'role',
  'state',
  'version',
  'made_at',
  'confirmed_at',
  'leaving_at',
  'second_factor_on_at',
  'region',
  'currency',
  'units',
  'is_demo',
];
const SECRETS = ['password_hash', 'second_factor_secret', 'second_factor_last_step'];

export type NewAccount = {
  readonly id: AccountId;
  readonly email: string;
  readonly name: string;
  readonly passwordHash: string | null;
  readonly role: AccountRole;
  readonly state: Extract<AccountState, 'unconfirmed' | 'open'>;
  readonly at: Date;
  readonly isDemo?: true;
};

/** Puts a new account in. Its address must be nobody's yet: the unique key refuses otherwise. */
export async function insertAccount(trx: Trx, account: NewAccount): Promise<void> {
  await trx('accounts').insert({
    id: account.id,
    email: account.email,
    name: account.name,
    password_hash: account.passwordHash,
    role: account.role,
    state: account.state,
    made_at: account.at,
    confirmed_at: account.state === 'open' ? account.at : null,
    is_demo: account.isDemo === true ? 1 : 0,
  });
}

export async function findAccount(db: Knex, id: AccountId): Promise<Account | null> {
  const row: unknown = await db('accounts').where({ id }).select(OPENLY).first();
  return row === undefined ? null : accountRow.parse(row);
}

/** By the normalised address, compared byte by byte. */
export async function findAccountByEmail(db: Knex, email: string): Promise<Account | null> {
  const row: unknown = await db('accounts').where({ email }).select(OPENLY).first();
  return row === undefined ? null : accountRow.parse(row);
}

/** Holds the account for the rest of the transaction. First thing in it: a plain read before would freeze what it sees. */
export async function lockAccount(trx: Trx, id: AccountId): Promise<Account | null> {
  const row: unknown = await trx('accounts').where({ id }).select(OPENLY).forUpdate().first();
  return row === undefined ? null : accountRow.parse(row);
}

export async function lockAccountByEmail(trx: Trx, email: string): Promise<Account | null> {
  const row: unknown = await trx('accounts').where({ email }).select(OPENLY).forUpdate().first();
  return row === undefined ? null : accountRow.parse(row);
}

/** What the person proves itself by. Null when there is no such account. */
export async function findSecrets(db: Knex, id: AccountId): Promise<AccountSecrets | null> {
  const row: unknown = await db('accounts').where({ id }).select(SECRETS).first();
  return row === undefined ? null : secretsRow.parse(row);
}

/** Account ids of one role whose holders can sign in, for the question whether one is left. */
export async function countHolders(trx: Trx, role: AccountRole): Promise<number> {
  const rows: unknown[] = await trx('accounts').where({ role, state: 'open' }).select('id').forUpdate();
  return rows.length;
}

/** Ids of leaving accounts whose days of grace were over at `now`, at most `most`. */
export async function listOverdue(db: Knex, now: Date, most: number): Promise<readonly AccountId[]> {
  const rows: unknown[] = await db('accounts')
    .where({ state: 'leaving' })
    .where('leaving_at', '<=', now)
    .orderBy('leaving_at')
    .limit(most)
    .select(OPENLY);
  return rows.map((row) => accountRow.parse(row).id);
}

type Changes = Readonly<Record<string, string | number | Date | Buffer | null>>;

async function alter(trx: Trx, id: AccountId, changes: Changes): Promise<void> {
  await trx('accounts')
    .where({ id })
    .update({ ...changes, version: trx.raw('version + 1') });
}

export const renameAccount = (trx: Trx, id: AccountId, name: string): Promise<void> => alter(trx, id, { name });

export const setPasswordHash = (trx: Trx, id: AccountId, hash: string): Promise<void> => alter(trx, id, { password_hash: hash });

/** The address may be taken by now: the unique key refuses then. */
export const setEmail = (trx: Trx, id: AccountId, email: string): Promise<void> => alter(trx, id, { email });

/** An unconfirmed account signed up for again belongs to the newest sign-up. */
export const replaceUnconfirmed = (trx: Trx, id: AccountId, name: string, hash: string): Promise<void> =>
  alter(trx, id, { name, password_hash: hash });

export const setPreferences = (trx: Trx, id: AccountId, { region, currency, units }: Preferences): Promise<void> =>
  alter(trx, id, { region, currency, units });

/** The address was proved; an account already confirmed keeps its first date. */
export async function confirmAccount(trx: Trx, id: AccountId, at: Date): Promise<void> {
  await trx('accounts')
    .where({ id, state: 'unconfirmed' })
    .update({ state: 'open', confirmed_at: at, version: trx.raw('version + 1') });
}

export const setRole = (trx: Trx, id: AccountId, role: AccountRole): Promise<void> => alter(trx, id, { role });

export const startLeaving = (trx: Trx, id: AccountId, until: Date): Promise<void> =>
  alter(trx, id, { state: 'leaving', leaving_at: until });

/** Back to what it was: an address never confirmed is not confirmed by staying. */
export const stopLeaving = (trx: Trx, id: AccountId, state: 'open' | 'unconfirmed'): Promise<void> =>
  alter(trx, id, { state, leaving_at: null });

export const closeAccount = (trx: Trx, id: AccountId): Promise<void> => alter(trx, id, { state: 'closed', leaving_at: null });

export const reopenAccount = (trx: Trx, id: AccountId): Promise<void> => alter(trx, id, { state: 'open' });

export type NewFactor = { readonly sealed: Buffer; readonly step: number; readonly at: Date };

/** `step` is that of the code it was turned on with: the same code opens nothing. */
export const turnSecondFactorOn = (trx: Trx, id: AccountId, { sealed, step, at }: NewFactor): Promise<void> =>
  alter(trx, id, { second_factor_secret: sealed, second_factor_on_at: at, second_factor_last_step: step });

export const turnSecondFactorOff = (trx: Trx, id: AccountId): Promise<void> =>
  alter(trx, id, { second_factor_secret: null, second_factor_on_at: null, second_factor_last_step: null });

/** Notes a code as used. False when one as late or later was used meanwhile: then this one is refused. */
export async function spendStep(trx: Trx, id: AccountId, step: number): Promise<boolean> {
  const changed = await trx('accounts')
    .where({ id })
    .where((query) => {
      void query.whereNull('second_factor_last_step').orWhere('second_factor_last_step', '<', step);
    })
    .update({ second_factor_last_step: step });
  return changed === 1;
}

/** What is left of a person: an id, a role that no longer counts, and the days it was here. */
export const emptyAccount = (trx: Trx, id: AccountId): Promise<void> =>
  alter(trx, id, {
    email: null,
    name: '',
    password_hash: null,
    state: 'gone',
    second_factor_secret: null,
    second_factor_on_at: null,
    second_factor_last_step: null,
    region: null,
    currency: null,
    units: 'metric',
  });
