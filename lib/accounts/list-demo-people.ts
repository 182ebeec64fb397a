import 'server-only';
import { DEMO_PASSWORD, DEMO_PEOPLE } from '@/content/seed/demo-people';
import { findAccountByEmail } from '@/db/accounts';
import type { AccountRole } from '@/lib/access/domain/actor';
import type { Ctx } from '@/lib/server/ctx';
import { env } from '@/lib/server/env';
import { codeNow, readFactorSecret } from '@/lib/server/second-factor';

export type ShownPerson = {
  readonly email: string;
  readonly name: string;
  readonly role: AccountRole;
  readonly password: string;
  /** The second step's secret and the code that is right at this moment. */
  readonly factor: { readonly secret: string; readonly code: string } | null;
};

/** The invented people, with all it takes to sign in as them. None unless this copy is for trying out. */
export async function listDemoPeople(ctx: Ctx): Promise<readonly ShownPerson[]> {
  if (!env.demo) return [];
  const there = await Promise.all(
    DEMO_PEOPLE.map(async (person) => ({ person, isThere: (await findAccountByEmail(ctx.db, person.email))?.isDemo === true })),
  );
  return there
    .filter(({ isThere }) => isThere)
    .map(({ person: { email, name, role, factorSecret } }) => {
      const secret = factorSecret === null ? null : readFactorSecret(factorSecret);
      const factor = secret === null ? null : { secret: factorSecret ?? '', code: codeNow(secret, ctx.now) };
      return { email, name, role, password: DEMO_PASSWORD, factor };
    });
}
