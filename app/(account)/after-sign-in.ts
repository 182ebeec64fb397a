import { nextPlace } from '@/lib/accounts/domain/next-place';
import type { SignedInNow } from '@/lib/accounts/sign-in';

/** Where a sign-in leads: to the second step, to the bench of an account that is leaving, or on to where somebody was going. */
export function afterSignIn(then: SignedInNow['then'], next: string | undefined): string {
  const place = nextPlace(next, '/bench');
  if (then === 'second-factor') return `/sign-in/second-factor?next=${encodeURIComponent(place)}`;
  return then === 'leaving' ? '/bench' : place;
}
