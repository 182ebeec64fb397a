import { words } from '@/lib/kernel/words';
import type { WithdrawRefusal } from '@/lib/regions/withdraw-edition';

type Kind = Exclude<WithdrawRefusal['kind'], 'not-in-use'>;

const SAID: Readonly<Record<Kind, () => string>> = {
  'not-found': () => words('review.withdraw.gone'),
  'nothing-before': () => words('review.withdraw.first'),
  findings: () => words('review.withdraw.findings'),
  'not-allowed': () => words('review.fault.not-allowed'),
  'key-reused': () => words('review.fault.key-reused'),
  busy: () => words('review.fault.busy'),
  'sign-in': () => words('review.fault.first'),
  'sign-in-again': () => words('review.fault.first'),
  'second-factor-needed': () => words('review.fault.first'),
  'confirm-first': () => words('review.fault.first'),
};

/** What a refused withdrawal says. Another edition may have come into use while one was reading. */
export const refusalWords = (refusal: WithdrawRefusal): Readonly<Record<string, string>> => ({
  form: refusal.kind === 'not-in-use' ? words('review.withdraw.notLast', { last: refusal.inUse }) : SAID[refusal.kind](),
});
