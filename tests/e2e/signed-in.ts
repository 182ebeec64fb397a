import { randomUUID } from 'node:crypto';
import { encode } from 'next-auth/jwt';
import type { Browser, BrowserContext } from 'playwright-core';
import { insertAccount } from '@/db/accounts';
import { db } from '@/db/connection';
import { insertSession } from '@/db/sessions';
import { inTransaction } from '@/db/transaction';
import type { AccountId, AccountRole } from '@/lib/access/domain/actor';
import { accountId } from '@/lib/accounts/schema';
import { ok } from '@/lib/kernel/result';
import { newId } from '@/lib/server/new-id';
import { sessionSecret } from '@/lib/server/seal';
import { newSession, sessionCookie } from '@/lib/server/session';
import { SITE, visit, type Setting } from './browser';

export type Person = { readonly id: AccountId; readonly email: string; readonly name: string; readonly role: AccountRole };

/** Puts an account with a confirmed address and the second step straight into the database. */
export async function aPerson(role: AccountRole, name = `Wilma ${randomUUID().slice(0, 8)}`): Promise<Person> {
  const at = new Date();
  const id = accountId.parse(newId(at));
  const email = `wilma-${id}@example.test`;
  await inTransaction(db, async (trx) => {
    await insertAccount(trx, { id, email, name, passwordHash: null, role, state: 'open', at });
    await trx('accounts').where({ id }).update({ second_factor_on_at: at });
    return ok(null);
  });
  return { id, email, name, role };
}

/** The cookie of a session just begun, with the second step given: `name=value`. */
export async function cookieOf({ id }: Person): Promise<string> {
  const now = new Date();
  const { sid, row } = newSession({ accountId: id, now, agent: 'journeys', freshAt: now, secondFactorAt: now });
  await inTransaction(db, async (trx) => {
    await insertSession(trx, row);
    return ok(null);
  });
  return `${sessionCookie().name}=${await encode({ token: { sid }, secret: sessionSecret(), maxAge: 3600 })}`;
}

/** Signs a visitor in as that person; whoever they were before, they are not any more. */
export async function signIn(context: BrowserContext, person: Person): Promise<void> {
  const [name = '', value = ''] = (await cookieOf(person)).split(/=(.*)/s);
  await context.addCookies([{ name, value, url: SITE, httpOnly: true, sameSite: 'Lax' }]);
}

/** A browser of its own in which that person is signed in. */
export async function visitAs(browser: Browser, person: Person, setting: Setting = {}): Promise<BrowserContext> {
  const context = await visit(browser, setting);
  await signIn(context, person);
  return context;
}
