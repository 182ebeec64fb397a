import { cache } from 'react';
import { slug } from '@/lib/kernel/shapes';
import { readRule, type ReadRule } from '@/lib/regions/read-rule';
import { makeCtx } from '@/lib/server/ctx';

/** The rule of that id as its newest edition has it; null where there is none. Read once a request. */
export const findRule = cache(async (id: string): Promise<ReadRule | null> => {
  if (!slug.safeParse(id).success) return null;
  const found = await readRule(makeCtx(), id);
  return found.ok ? found.value : null;
});

/** The same, of a sheet's edition in use alone. */
export async function findRuleInUse(id: string): Promise<ReadRule | null> {
  const found = await findRule(id);
  return found === null || found.withdrawn ? null : found;
}
