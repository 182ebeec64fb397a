import 'server-only';
import { DEMO_PASSWORD, DEMO_PEOPLE, type DemoPerson } from '@/content/seed/demo-people';
import {
  confirmAccount,
  insertAccount,
  lockAccountByEmail,
  setPasswordHash,
  setPreferences,
  setRole,
  turnSecondFactorOn,
} from '@/db/accounts';
import { inTransaction } from '@/db/transaction';
import { ok } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { newId } from '@/lib/server/new-id';
import { hashPassword } from '@/lib/server/password';
import { readFactorSecret, sealFactorSecret } from '@/lib/server/second-factor';
import { accountId } from './schema';

/** Puts the invented people in, or back as they were: visitors of a demonstration may have changed them. */
export async function putDemoPeople(ctx: Ctx): Promise<void> {
  const hash = await hashPassword(DEMO_PASSWORD);
  for (const person of DEMO_PEOPLE) await putPerson(ctx, person, hash);
}

async function putPerson({ db, now }: Ctx, person: DemoPerson, hash: string): Promise<void> {
  const { email, name, role, preferences } = person;
  await inTransaction(db, async (trx) => {
    const there = await lockAccountByEmail(trx, email);
    const id = there?.id ?? accountId.parse(newId(now));
    if (there === null) await insertAccount(trx, { id, email, name, passwordHash: hash, role, state: 'open', at: now, isDemo: true });
    else if (there.isDemo) {
      await setPasswordHash(trx, id, hash);
      await setRole(trx, id, role);
      await confirmAccount(trx, id, now);
    } else return ok(null); // somebody of that address, and not one of ours
    if (there === null) await setPreferences(trx, id, preferences);
    const secret = person.factorSecret === null ? null : readFactorSecret(person.factorSecret);
    if (secret !== null) await turnSecondFactorOn(trx, id, { sealed: sealFactorSecret(id, secret), step: 0, at: now });
    return ok(null);
  });
}
