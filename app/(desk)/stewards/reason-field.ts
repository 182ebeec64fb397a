import type { EntryFieldPlan } from '@/components/accounts/entry-field';
import { words } from '@/lib/kernel/words';

/** The reason that every act on another's role or account needs. */
export const reasonField = (): EntryFieldPlan => ({
  name: 'reason',
  type: 'long-text',
  label: words('stewards.reason.field'),
  hint: words('stewards.reason.hint'),
});
