import { notFound } from 'next/navigation';
import type { Action } from '@/lib/access/domain/policy';
import { readAccount, type SeenAccount } from '@/lib/accounts/read-account';
import { accountId } from '@/lib/accounts/schema';
import { enter } from '@/lib/server/lead-on';

/** The account of a desk page, for whoever may do `action` to it; otherwise the way to what is missing, or no page at all. */
export async function findAccount(id: string, action: Action, here: (id: string) => string): Promise<SeenAccount> {
  const { ctx } = await enter(action, here(encodeURIComponent(id)));
  const parsed = accountId.safeParse(id);
  const found = parsed.success ? await readAccount(ctx, parsed.data) : null;
  if (found?.ok !== true) notFound();
  return found.value;
}
