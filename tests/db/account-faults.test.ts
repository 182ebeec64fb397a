import type { Knex } from 'knex';
import { afterAll, beforeEach, expect, test } from 'vitest';
import { findAccountByEmail } from '@/db/accounts';
import { db } from '@/db/connection';
import type { AccountRole } from '@/lib/access/domain/actor';
import { changeRole } from '@/lib/accounts/change-role';
import { closeAccount } from '@/lib/accounts/close-account';
import type { Account } from '@/lib/accounts/domain/account';
import { leaveAccount } from '@/lib/accounts/leave-account';
import { mailLink } from '@/lib/accounts/mail-link';
import { resetPassword } from '@/lib/accounts/reset-password';
import { signUp } from '@/lib/accounts/sign-up';
import { spendConfirmation } from '@/lib/accounts/spend-confirmation';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { aCtx, address, aPerson, aVisit, emptyTables, key, NOW, READER, tokenIn } from './account-people';
import { FAULTS, openFaultyPool, type Fault } from './faulty';

const pool = openFaultyPool();
afterAll(async () => {
  await pool.db.destroy();
});
beforeEach(emptyTables);

type End = { readonly ok: boolean };
/** Somebody, and an act that may be done again and again under one key. */
type Plan = { readonly email: string; readonly key: string; readonly act: (through: Knex) => Promise<End> };

let count = 0;
function nextEmail(): string {
  count += 1;
  return `potter${String(count)}@example.test`;
}
/** A reader who calls from an address of their own, so that no limit is met. */
const reader = (through: Knex): ActorCtx => ({ ...aCtx(READER, NOW, `caller ${String(count)}`), db: through });

async function aSteward(): Promise<ActorCtx> {
  const steward = await aPerson(nextEmail(), { role: 'steward', name: 'Runa' });
  const { ctx } = await aVisit(steward, { secondFactorAt: NOW });
  return ctx.actor.kind === 'account' ? { ...ctx, actor: { ...ctx.actor, secondFactor: 'given' } } : ctx;
}

async function signedIn(
  role: AccountRole = 'maker',
): Promise<{ readonly account: Account; readonly email: string; readonly ctx: ActorCtx }> {
  const email = nextEmail();
  const account = await aPerson(email, { role });
  const { ctx } = await aVisit(account);
  return { account, email, ctx };
}

const PLANS: Readonly<Record<string, () => Promise<Plan>>> = {
  'sign-up'() {
    const plan = { email: nextEmail(), key: key() };
    const input = { key: plan.key, email: address(plan.email), name: 'Mara Lindqvist', password: 'slow wheel, wet hands' };
    return Promise.resolve({ ...plan, act: (through: Knex) => signUp(reader(through), input) });
  },
  async confirmation() {
    const plan = { email: nextEmail(), key: key() };
    await signUp(reader(db), { key: key(), email: address(plan.email), name: 'Mara', password: 'slow wheel, wet hands' });
    const token = await tokenFor(plan.email, 'confirm-address');
    return { ...plan, act: (through) => spendConfirmation(reader(through), { key: plan.key, token }) };
  },
  async reset() {
    const { email } = await signedIn();
    const plan = { email, key: key() };
    await mailLink(reader(db), 'reset', { key: key(), email: address(email) });
    const token = await tokenFor(email, 'reset-password');
    return { ...plan, act: (through) => resetPassword(reader(through), { key: plan.key, token, password: 'dry hands, slow wheel' }) };
  },
  async 'a role granted'() {
    const [steward, { account, email }] = [await aSteward(), await signedIn()];
    const plan = { email, key: key() };
    const input = { key: plan.key, id: account.id, from: 'maker' as const, role: 'moderator' as const, reason: 'Knows the law.' };
    return { ...plan, act: (through) => changeRole({ ...steward, db: through }, input) };
  },
  async 'an account closed'() {
    const [steward, { account, email }] = [await aSteward(), await signedIn()];
    const plan = { email, key: key() };
    return {
      ...plan,
      act: (through) => closeAccount({ ...steward, db: through }, { key: plan.key, id: account.id, reason: 'Advertising.' }),
    };
  },
  async 'an account left'() {
    const { email, ctx } = await signedIn();
    const plan = { email, key: key() };
    return { ...plan, act: (through) => leaveAccount({ ...ctx, db: through }, { key: plan.key }) };
  },
};

async function tokenFor(email: string, kind: string): Promise<string> {
  await db('outbox').whereNot({ address: email }).del();
  return tokenIn(kind);
}

/** All that such an act changes, without what chance puts into it. */
async function stateOf({ email, key: of }: Plan): Promise<unknown> {
  const account = await findAccountByEmail(db, email);
  const rows = async (table: string, where: object): Promise<number> => (await db(table).where(where).select('*')).length;
  const id = account?.id ?? 'nobody';
  const { role, state, version, confirmedAt } = account ?? {};
  return {
    account: [role, state, version, confirmedAt ?? null],
    sessions: await rows('sessions', { account_id: id }),
    tokens: await rows('account_tokens', { account_id: id }),
    mails: await rows('outbox', { address: email }),
    lines: await rows('day_book', { subject_id: id }),
    keys: await rows('request_keys', { id: of }),
  };
}

async function tryOnce(fault: Fault, failing: number, make: () => Promise<Plan>, after: unknown): Promise<void> {
  const said = `${fault} at statement ${String(failing)}`;
  const plan = await make();
  const before = await stateOf(plan);
  pool.plan(fault, (statement) => statement === failing);
  const end = await plan.act(pool.db).catch(() => 'thrown' as const);
  pool.plan(fault, () => false);
  // Whoever hears yes has it; whoever hears that something broke has nothing of it.
  expect(await stateOf(plan), said).toEqual(end === 'thrown' ? before : after);
  if (end !== 'thrown') expect(end, said).toMatchObject({ ok: true });
  expect(await plan.act(pool.db), `${said}, sent again`).toMatchObject({ ok: true });
  expect(await stateOf(plan), `${said}, sent again`).toEqual(after);
}

test.each(Object.entries(PLANS))(
  'SRV-4 F03 %s: whichever statement fails and however, it is done once or not at all, and the answer says which',
  async (_, make) => {
    const plain = await make();
    const before = await stateOf(plain);
    pool.plan('rolled-back', () => false);
    expect(await plain.act(pool.db)).toMatchObject({ ok: true });
    const statements = pool.seen();
    const after = await stateOf(plain);
    expect(after).not.toEqual(before);
    expect(statements).toBeGreaterThan(6);
    for (const fault of FAULTS) for (let failing = 1; failing <= statements; failing += 1) await tryOnce(fault, failing, make, after);
  },
  120_000,
);
