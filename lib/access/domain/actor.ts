/** UUIDv7 of an account, made on our side. */
export type AccountId = string & { readonly __brand: 'AccountId' };

/** Ascending; each may do what those before it may. */
export const ROLES = ['reader', 'maker', 'editor', 'moderator', 'steward'] as const;
export type Role = (typeof ROLES)[number];
/** What an account can be; a reader has none. */
export type AccountRole = Exclude<Role, 'reader'>;

/** `waiting`: it is on, and this session has not given it yet. */
export type SecondFactorState = 'off' | 'waiting' | 'given';

/** Who asks, as the session's row says at this request. */
export type Actor =
  | { readonly kind: 'reader' }
  | {
      readonly kind: 'account';
      readonly id: AccountId;
      readonly role: AccountRole;
      readonly name: string;
      /** The address was confirmed by mail. */
      readonly confirmed: boolean;
      readonly secondFactor: SecondFactorState;
      /** Until then the password counts as typed just now. */
      readonly freshUntil: Date;
    };

export type SignedIn = Extract<Actor, { kind: 'account' }>;

export const READER: Actor = { kind: 'reader' };

export const roleOf = (actor: Actor): Role => (actor.kind === 'account' ? actor.role : 'reader');

/** How high a role stands: 0 for a reader. */
export const rankOf = (role: Role): number => ROLES.indexOf(role);
