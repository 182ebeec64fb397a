import { z } from 'zod';
import { ROLES, type AccountId, type AccountRole } from '@/lib/access/domain/actor';
import { ACCOUNT_STATES, UNITS, type Account } from '@/lib/accounts/domain/account';
import { REQUEST_STATES, type RoleRequest } from '@/lib/accounts/domain/role-request';
import type { FoundSession } from '@/lib/accounts/domain/session';

/** The secrets of an account, read only where somebody proves who they are. */
export type AccountSecrets = {
  readonly passwordHash: string | null;
  readonly secondFactorSecret: Buffer | null;
  readonly secondFactorLastStep: number | null;
};

const accountId = z.string().transform((id) => id as AccountId);
const role = z.enum(ROLES.filter((one): one is AccountRole => one !== 'reader'));
const state = z.enum(ACCOUNT_STATES);
const flag = z.union([z.number(), z.boolean()]).transform(Boolean);

export const accountRow = z
  .object({
    id: accountId,
    email: z.string().nullable(),
    name: z.string(),
    role,
    state,
    version: z.number(),
    made_at: z.date(),
    confirmed_at: z.date().nullable(),
    leaving_at: z.date().nullable(),
    second_factor_on_at: z.date().nullable(),
    region: z.string().nullable(),
    currency: z.string().nullable(),
    units: z.enum(UNITS),
    is_demo: flag,
  })
  .transform((row): Account => ({
    id: row.id,
    email: row.email,
    name: row.name,
    role: row.role,
    state: row.state,
    version: row.version,
    madeAt: row.made_at,
    confirmedAt: row.confirmed_at,
    leavingAt: row.leaving_at,
    secondFactorOnAt: row.second_factor_on_at,
    preferences: { region: row.region, currency: row.currency, units: row.units },
    isDemo: row.is_demo,
  }));

export const secretsRow = z
  .object({
    password_hash: z.string().nullable(),
    second_factor_secret: z.instanceof(Buffer).nullable(),
    second_factor_last_step: z.coerce.number().nullable(),
  })
  .transform((row): AccountSecrets => ({
    passwordHash: row.password_hash,
    secondFactorSecret: row.second_factor_secret,
    secondFactorLastStep: row.second_factor_last_step,
  }));

export const sessionRow = z
  .object({
    account_id: accountId,
    name: z.string(),
    role,
    state,
    confirmed_at: z.date().nullable(),
    second_factor_on_at: z.date().nullable(),
    second_factor_at: z.date().nullable(),
    fresh_at: z.date(),
    seen_at: z.date(),
    made_at: z.date(),
    ends_at: z.date(),
  })
  .transform((row): FoundSession => ({
    accountId: row.account_id,
    name: row.name,
    role: row.role,
    state: row.state,
    confirmed: row.confirmed_at !== null,
    secondFactorOn: row.second_factor_on_at !== null,
    secondFactorAt: row.second_factor_at,
    freshAt: row.fresh_at,
    seenAt: row.seen_at,
    madeAt: row.made_at,
    endsAt: row.ends_at,
  }));

export const sessionLineRow = z
  .object({ id: z.instanceof(Buffer), agent: z.string(), made_at: z.date(), seen_at: z.date(), ends_at: z.date() })
  .transform((row) => ({ id: row.id, agent: row.agent, madeAt: row.made_at, seenAt: row.seen_at, endsAt: row.ends_at }));
export type SessionLine = z.output<typeof sessionLineRow>;

export const tokenRow = z
  .object({ account_id: accountId, email: z.string().nullable() })
  .transform((row) => ({ accountId: row.account_id, email: row.email }));
export type SpentToken = z.output<typeof tokenRow>;

const codes = z
  .union([z.string(), z.array(z.string())])
  .transform((value): unknown => (typeof value === 'string' ? JSON.parse(value) : value))
  .pipe(z.array(z.string()));

export const roleRequestRow = z
  .object({
    id: z.string(),
    account_id: accountId,
    why: z.string(),
    regions: codes,
    state: z.enum(REQUEST_STATES),
    answer: z.string().nullable(),
    answered_by: accountId.nullable(),
    made_at: z.date(),
    answered_at: z.date().nullable(),
  })
  .transform((row): RoleRequest => ({
    id: row.id,
    accountId: row.account_id,
    why: row.why,
    regions: row.regions,
    state: row.state,
    answer: row.answer,
    answeredBy: row.answered_by,
    madeAt: row.made_at,
    answeredAt: row.answered_at,
  }));
