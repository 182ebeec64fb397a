import { err, ok, type Result } from '@/lib/kernel/result';
import { rankOf, roleOf, ROLES, type Actor, type Role, type SignedIn } from './actor';

/** All that can be asked of the site by somebody with a role. Each has a line in `POLICY`, or this does not compile. */
export type Action =
  | 'account.sign-up'
  | 'account.sign-in'
  | 'account.ask-reset'
  | 'account.spend-token'
  | 'account.read-own'
  | 'account.confirm-again'
  | 'account.sign-in-again'
  | 'account.give-second-factor'
  | 'account.rename'
  | 'account.set-preferences'
  | 'account.change-password'
  | 'account.change-address'
  | 'account.set-second-factor'
  | 'account.read-sessions'
  | 'account.end-session'
  | 'account.export'
  | 'account.leave'
  | 'account.stay'
  | 'account.look-up'
  | 'account.close'
  | 'role.ask'
  | 'role.withdraw'
  | 'role.read-requests'
  | 'role.answer'
  | 'role.grant'
  | 'outbox.read'
  | 'outbox.retry'
  | 'health.read'
  | 'amendment.write'
  | 'amendment.judge'
  | 'edition.withdraw'
  | 'doubt.raise'
  | 'doubt.answer'
  | 'sheet.keep'
  | 'file.keep'
  | 'file.read';

const from = (lowest: Role): readonly Role[] => ROLES.slice(rankOf(lowest));

/** The one table of who may do what. Ties to a record (own, another's) are judged in the slice that has the record. */
export const POLICY: Readonly<Record<Action, readonly Role[]>> = {
  'account.sign-up': from('reader'),
  'account.sign-in': from('reader'),
  'account.ask-reset': from('reader'),
  'account.spend-token': from('reader'),
  'account.read-own': from('maker'),
  'account.confirm-again': from('maker'),
  'account.sign-in-again': from('maker'),
  'account.give-second-factor': from('maker'),
  'account.rename': from('maker'),
  'account.set-preferences': from('maker'),
  'account.change-password': from('maker'),
  'account.change-address': from('maker'),
  'account.set-second-factor': from('maker'),
  'account.read-sessions': from('maker'),
  'account.end-session': from('maker'),
  'account.export': from('maker'),
  'account.leave': from('maker'),
  'account.stay': from('maker'),
  'account.look-up': from('steward'),
  'account.close': from('steward'),
  'role.ask': ['maker'],
  'role.withdraw': from('maker'),
  'role.read-requests': from('steward'),
  'role.answer': from('steward'),
  'role.grant': from('steward'),
  'outbox.read': from('steward'),
  'outbox.retry': from('steward'),
  'health.read': from('steward'),
  'amendment.write': from('editor'),
  'amendment.judge': from('moderator'),
  'edition.withdraw': from('moderator'),
  'doubt.raise': from('reader'),
  'doubt.answer': from('editor'),
  'sheet.keep': from('editor'),
  'file.keep': from('editor'),
  'file.read': from('editor'),
};

/** Those that need the password typed less than ten minutes ago. */
export const DELICATE: ReadonlySet<Action> = new Set<Action>([
  'account.change-address',
  'account.set-second-factor',
  'account.export',
  'account.leave',
  'account.close',
  'role.answer',
  'role.grant',
]);

/** Closed to an account whose address is not confirmed: what others see, or what speaks in its name. */
export const NEEDS_CONFIRMED: ReadonlySet<Action> = new Set<Action>([
  'role.ask',
  'amendment.write',
  'doubt.answer',
  'sheet.keep',
  'file.keep',
]);

/** Open to a session that still owes its second factor; whatever a reader may do is open to it as well. */
const WHILE_WAITING: ReadonlySet<Action> = new Set<Action>(['account.give-second-factor']);

/** Kinds of "not now", in the words of what has to be done first. */
export type AccessRefusal =
  | { readonly kind: 'sign-in' }
  | { readonly kind: 'not-allowed' }
  | { readonly kind: 'confirm-first' }
  | { readonly kind: 'second-factor-needed' }
  | { readonly kind: 'sign-in-again' };
export type NotNow = AccessRefusal['kind'];

/** Whether the actor's role may ever do that: what pages ask before they show a way to it. */
export const can = (actor: Actor, action: Action): boolean => POLICY[action].includes(roleOf(actor));

/** What only moderators or stewards may do wants their second factor, whether or not they have set one up yet. */
export const wantsSecondFactor = (action: Action): boolean => POLICY[action].every((role) => rankOf(role) >= rankOf('moderator'));

/** Whether the actor may do that at this instant: what every use case asks first. */
export function mayNow(actor: Actor, action: Action, now: Date): Result<null, AccessRefusal> {
  if (can({ kind: 'reader' }, action)) return ok(null);
  if (actor.kind === 'reader') return err({ kind: 'sign-in' });
  if (!can(actor, action)) return err({ kind: 'not-allowed' });
  const missing = firstMissing(actor, action, now);
  return missing === null ? ok(null) : err({ kind: missing });
}

function firstMissing(actor: SignedIn, action: Action, now: Date): NotNow | null {
  if (actor.secondFactor === 'waiting' && !WHILE_WAITING.has(action)) return 'second-factor-needed';
  if (!actor.confirmed && needsConfirmed(action)) return 'confirm-first';
  if (wantsSecondFactor(action) && actor.secondFactor !== 'given') return 'second-factor-needed';
  return isStale(actor, action, now) ? 'sign-in-again' : null;
}

const isStale = (actor: SignedIn, action: Action, now: Date): boolean => DELICATE.has(action) && now >= actor.freshUntil;

const needsConfirmed = (action: Action): boolean => NEEDS_CONFIRMED.has(action) || wantsSecondFactor(action);
