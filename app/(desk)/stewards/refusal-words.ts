import type { AnswerRefusal } from '@/lib/accounts/answer-request';
import type { ChangeRoleRefusal } from '@/lib/accounts/change-role';
import type { CloseRefusal } from '@/lib/accounts/close-account';
import type { ReopenRefusal } from '@/lib/accounts/reopen-account';
import { words } from '@/lib/kernel/words';

export type DeskRefusal = AnswerRefusal | ChangeRoleRefusal | CloseRefusal | ReopenRefusal;

type Kind = DeskRefusal['kind'];
type Place = 'form' | 'reason' | 'role';

/** What each refusal says, and at which field. Those with a door of their own are led there before these words are needed. */
const SAID: Readonly<Record<Kind, readonly [Place, () => string]>> = {
  'names-person': ['reason', () => words('stewards.fault.reason.names')],
  'changed-meanwhile': ['form', () => words('stewards.fault.changed-meanwhile')],
  'same-role': ['role', () => words('stewards.fault.same-role')],
  'too-high': ['form', () => words('stewards.fault.too-high')],
  'not-open': ['form', () => words('stewards.fault.not-open')],
  'last-steward': ['form', () => words('stewards.fault.last-steward')],
  'own-account': ['form', () => words('stewards.fault.own-account')],
  'closed-already': ['form', () => words('stewards.fault.closed-already')],
  'not-closed': ['form', () => words('stewards.fault.not-closed')],
  leaving: ['form', () => words('stewards.fault.leaving')],
  'not-found': ['form', () => words('stewards.fault.not-found')],
  answered: ['form', () => words('stewards.fault.answered')],
  'not-allowed': ['form', () => words('stewards.fault.not-allowed')],
  'key-reused': ['form', () => words('stewards.fault.key-reused')],
  busy: ['form', () => words('stewards.fault.busy')],
  'sign-in': ['form', () => words('stewards.fault.first')],
  'sign-in-again': ['form', () => words('stewards.fault.first')],
  'second-factor-needed': ['form', () => words('stewards.fault.first')],
  'confirm-first': ['form', () => words('stewards.fault.first')],
};

/** The words of a refusal under the name of their field. */
export function refusalWords({ kind }: DeskRefusal): Readonly<Record<string, string>> {
  const [place, say] = SAID[kind];
  return { [place]: say() };
}
