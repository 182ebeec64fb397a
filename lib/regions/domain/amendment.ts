import type { AccountId } from '@/lib/access/domain/actor';
import { err, ok, type Result } from '@/lib/kernel/result';

/** UUIDv7 of an amendment, made on our side. */
export type AmendmentId = string & { readonly __brand: 'AmendmentId' };

export const AMENDMENT_STATES = ['draft', 'sent', 'held', 'sent-back', 'once-approved', 'withdrawn', 'in-use', 'refused-stale'] as const;
export type AmendmentState = (typeof AMENDMENT_STATES)[number];

/** A proposed change to a sheet: the whole document as it is to be, and the edition it was begun from. */
export type Amendment = {
  readonly id: AmendmentId;
  readonly region: string;
  readonly authorId: AccountId;
  readonly state: AmendmentState;
  /** Counts every change to the document or the state; a decision names the one it was taken on. */
  readonly version: number;
  /** Null for a place that has no sheet yet. */
  readonly baseNumber: number | null;
  /** What changes and why, in the author's words; becomes the edition's summary. */
  readonly summary: string;
  /** Of trial pieces that come out otherwise: why that is meant, by id. */
  readonly intended: Readonly<Record<string, string>>;
  readonly madeAt: Date;
  readonly changedAt: Date;
  readonly sentAt: Date | null;
  /** The moderator who opened it last, and when. */
  readonly openedBy: AccountId | null;
  readonly openedAt: Date | null;
  /** The number it came into use as. */
  readonly editionNumber: number | null;
};

/** What an author may do to their own amendment, and what a moderator may do to another's. */
export const AUTHOR_ACTS = ['save', 'send', 'take-back', 'withdraw', 'reopen', 'carry-over'] as const;
export const MODERATOR_ACTS = ['hold', 'release', 'send-back', 'approve-once', 'approve', 'refuse-stale'] as const;
export type AuthorAct = (typeof AUTHOR_ACTS)[number];
export type ModeratorAct = (typeof MODERATOR_ACTS)[number];
export type AmendmentAct = AuthorAct | ModeratorAct;

type Step = Partial<Readonly<Record<AmendmentState, AmendmentState>>>;

/** The one table of the life of an amendment: for each act, from which state to which. */
export const LIFE: Readonly<Record<AmendmentAct, Step>> = {
  save: { draft: 'draft', 'sent-back': 'sent-back', 'refused-stale': 'refused-stale' },
  send: { draft: 'sent', 'sent-back': 'sent' },
  'take-back': { sent: 'draft', held: 'draft', 'once-approved': 'draft' },
  withdraw: {
    draft: 'withdrawn',
    sent: 'withdrawn',
    held: 'withdrawn',
    'sent-back': 'withdrawn',
    'once-approved': 'withdrawn',
    'refused-stale': 'withdrawn',
  },
  reopen: { withdrawn: 'draft' },
  'carry-over': { draft: 'draft', 'sent-back': 'draft', 'refused-stale': 'draft' },
  hold: { sent: 'held', 'once-approved': 'held' },
  // What was approved once before it was held is looked at afresh.
  release: { held: 'sent' },
  'send-back': { sent: 'sent-back', held: 'sent-back', 'once-approved': 'sent-back' },
  'approve-once': { sent: 'once-approved' },
  approve: { sent: 'in-use', 'once-approved': 'in-use' },
  'refuse-stale': { sent: 'refused-stale', held: 'refused-stale', 'once-approved': 'refused-stale' },
};

export type AmendmentRefusal =
  | { readonly kind: 'not-found' }
  | { readonly kind: 'own-amendment' }
  /** It is in a state from which this cannot be done. */
  | { readonly kind: 'already-decided'; readonly state: AmendmentState };

const byAuthor = (act: AmendmentAct): act is AuthorAct => AUTHOR_ACTS.some((one) => one === act);

/**
 * REG-51 four eyes, and only the steps of `LIFE`. Answers with the state the act leads to. Whether the role allows the act at all
 * is asked before; this judges the tie to the record: an author acts on their own amendment, a moderator never does, and what
 * its author has not sent is there for nobody else.
 */
export function judgeAct(amendment: Amendment, who: AccountId, act: AmendmentAct): Result<AmendmentState, AmendmentRefusal> {
  const isOwn = amendment.authorId === who;
  const isThere = isOwn || (!byAuthor(act) && mayModeratorsRead(amendment));
  if (!isThere) return err({ kind: 'not-found' });
  if (isOwn && !byAuthor(act)) return err({ kind: 'own-amendment' });
  const next = LIFE[act][amendment.state];
  return next === undefined ? err({ kind: 'already-decided', state: amendment.state }) : ok(next);
}

/** A draft, and what was taken back or withdrawn before anybody decided, is its author's alone. */
export const mayModeratorsRead = ({ state, sentAt }: Pick<Amendment, 'state' | 'sentAt'>): boolean =>
  sentAt !== null && state !== 'draft' && state !== 'withdrawn';

/** Waiting for a moderator. */
export const isWaiting = (state: AmendmentState): boolean => state === 'sent' || state === 'held' || state === 'once-approved';

/** Can still come into use. */
export const isOpen = (state: AmendmentState): boolean => state !== 'in-use' && state !== 'withdrawn';
