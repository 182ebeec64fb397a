import type { AccessRefusal } from '@/lib/access/domain/policy';
import { words } from '@/lib/kernel/words';
import type { AmendmentState } from '@/lib/regions/domain/amendment';
import type { ChangeRefusal } from '@/lib/server/change';

/** Every kind of refusal that a moderator's form can meet. */
export type ReviewRefusal =
  | AccessRefusal
  | ChangeRefusal
  | { readonly kind: 'already-decided'; readonly state: AmendmentState; readonly by: string | null }
  | { readonly kind: 'not-all-read'; readonly claims: readonly string[] }
  | { readonly kind: 'not-found' | 'own-amendment' | 'same-moderator' | 'findings' | 'superseded' | 'no-such-claim' };

type Kind = Exclude<ReviewRefusal['kind'], 'already-decided' | 'not-all-read'>;

/** Those with a door of their own are led there before these words are needed. */
const SAID: Readonly<Record<Kind, () => string>> = {
  'not-found': () => words('review.fault.not-found'),
  'own-amendment': () => words('review.fault.own-amendment'),
  'same-moderator': () => words('review.fault.same-moderator'),
  findings: () => words('review.fault.findings'),
  superseded: () => words('review.fault.superseded'),
  'no-such-claim': () => words('review.fault.superseded'),
  'not-allowed': () => words('review.fault.not-allowed'),
  'key-reused': () => words('review.fault.key-reused'),
  busy: () => words('review.fault.busy'),
  'sign-in': () => words('review.fault.first'),
  'sign-in-again': () => words('review.fault.first'),
  'second-factor-needed': () => words('review.fault.first'),
  'confirm-first': () => words('review.fault.first'),
};

/** What a refusal says. Who was faster is named, and what they have decided. */
export function sayRefusal(refusal: ReviewRefusal): string {
  if (refusal.kind === 'already-decided') {
    return words(`review.fault.already-decided.${refusal.state}`, { by: refusal.by ?? words('review.fault.decided-by') });
  }
  if (refusal.kind === 'not-all-read') return words('review.fault.not-all-read', { count: refusal.claims.length });
  return SAID[refusal.kind]();
}

/** The same for a form: none of these belongs to a field. */
export const refusalWords = (refusal: ReviewRefusal): Readonly<Record<string, string>> => ({ form: sayRefusal(refusal) });
