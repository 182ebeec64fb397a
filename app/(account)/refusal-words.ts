import type { AccessRefusal } from '@/lib/access/domain/policy';
import type { PasswordFault } from '@/lib/accounts/domain/password-rules';
import { words } from '@/lib/kernel/words';
import type { ChangeRefusal } from '@/lib/server/change';
import type { TooMany } from '@/lib/server/limits';

/** Every kind of refusal that the forms of accounts can meet. */
export type AccountRefusal =
  | AccessRefusal
  | ChangeRefusal
  | TooMany
  | { readonly kind: 'password'; readonly fault: PasswordFault }
  | { readonly kind: 'wrong' }
  | { readonly kind: 'wrong-code' }
  | { readonly kind: 'same-address' }
  | { readonly kind: 'unknown-region' }
  | { readonly kind: 'closed' | 'already-on' | 'waiting-already' | 'answered' | 'last-steward' | 'not-found' };

type Words = Readonly<Record<string, string>>;

const PASSWORD: Readonly<Record<PasswordFault, () => string>> = {
  'too-short': () => words('accounts.fault.password.short'),
  'too-long': () => words('accounts.fault.password.long'),
  common: () => words('accounts.fault.password.common'),
  'own-words': () => words('accounts.fault.password.own'),
};

/** What a refusal says, under the name of the field it belongs to. `wrong` is said at the field that asks for the password. */
export function refusalWords(refusal: AccountRefusal): Words {
  if (refusal.kind === 'password') return { password: PASSWORD[refusal.fault]() };
  if (refusal.kind === 'wrong') return { password: words('accounts.fault.current') };
  if (refusal.kind === 'wrong-code') return { code: words('accounts.fault.code.wrong') };
  if (refusal.kind === 'same-address') return { email: words('accounts.fault.sameAddress') };
  if (refusal.kind === 'unknown-region') return { region: words('accounts.fault.region') };
  return { form: formWords(refusal) };
}

type OfForm = Exclude<AccountRefusal, { kind: 'password' | 'wrong' | 'wrong-code' | 'same-address' | 'unknown-region' }>;

const FORM: Readonly<Record<Exclude<OfForm['kind'], 'too-many'>, () => string>> = {
  'sign-in': () => words('accounts.signIn.why'),
  'not-allowed': () => words('accounts.fault.notAllowed'),
  'not-found': () => words('accounts.fault.notAllowed'),
  'confirm-first': () => words('accounts.fault.confirmFirst'),
  'second-factor-needed': () => words('accounts.factor.needed.title'),
  'sign-in-again': () => words('accounts.again.title'),
  'key-reused': () => words('accounts.fault.again'),
  busy: () => words('accounts.fault.busy'),
  closed: () => words('accounts.fault.closed'),
  'already-on': () => words('accounts.fault.alreadyOn'),
  'waiting-already': () => words('accounts.fault.waiting'),
  answered: () => words('accounts.fault.answered'),
  'last-steward': () => words('accounts.fault.lastSteward'),
};

const formWords = (refusal: OfForm): string =>
  'retryAfterS' in refusal ? words('accounts.fault.tooMany', { minutes: Math.ceil(refusal.retryAfterS / 60) }) : FORM[refusal.kind]();
