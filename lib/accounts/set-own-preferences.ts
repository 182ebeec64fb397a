import 'server-only';
import { setPreferences } from '@/db/accounts';
import { listRegions } from '@/db/regions';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import type { PreferencesInput } from './schema';

export type PreferencesRefusal = AccessRefusal | ChangeRefusal | { readonly kind: 'unknown-region' };

/** Keeps where somebody works, in which money they count, and in which units they like to read. */
export async function setOwnPreferences(ctx: ActorCtx, input: PreferencesInput): Promise<Result<null, PreferencesRefusal>> {
  const own = askSignedIn(ctx, 'account.set-preferences');
  if (!own.ok) return own;
  const { id } = own.value;
  const { key, region, currency, units } = input;
  const asked = { key, who: id, act: 'accounts.preferences', input: { region, currency, units } };
  const regions = region === null ? [] : await listRegions(ctx.db);
  if (region !== null && !regions.some(({ code }) => code === region)) return err({ kind: 'unknown-region' });
  return change(ctx, asked, async (trx) => {
    await setPreferences(trx, id, { region, currency, units });
    return ok(null);
  });
}
