import { rankOf, ROLES, type AccountRole } from '@/lib/access/domain/actor';
import type { AccountState } from '@/lib/accounts/domain/account';
import type { Json } from '@/lib/kernel/canonical-json';
import type { DayBookEntry } from './entry';
import { ACTS, isAct, type Act } from './kinds';

/** An account as far as the day book may read of it. */
export type Person = { readonly id: string; readonly name: string; readonly role: AccountRole; readonly state: AccountState };

/** How a line speaks of somebody: stewards by their role, editors and moderators by the name they chose, makers not at all. */
export type Said = { readonly kind: 'site' | 'steward' | 'former-editor' } | { readonly kind: 'named'; readonly name: string };

/** A line as everybody may read it. */
export type ToldLine = {
  readonly number: number;
  readonly at: Date;
  /** Null for an act that is not in `ACTS`: then `did` is shown as it is. */
  readonly act: Act | null;
  readonly did: string;
  readonly who: Said;
  /** Whose role it was; null where the line is about nobody, or about somebody who is not to be named. */
  readonly whom: Said | null;
  readonly subjectKind: string;
  readonly change: { readonly from: AccountRole; readonly to: AccountRole } | null;
  readonly reason: string | null;
};

/** Tells a line by what is known of its people today. A name that was changed or taken back is not kept here. */
export function tellLine(entry: DayBookEntry, people: ReadonlyMap<string, Person>): ToldLine {
  const { number, at, did, actorId, subject, details, reason } = entry;
  const change = changeIn(details);
  return {
    number,
    at,
    act: isAct(did) ? did : null,
    did,
    who: whoDid(did, actorId, people),
    whom: change === null ? null : nameOf(people.get(subject.id)),
    subjectKind: subject.kind,
    change,
    reason,
  };
}

/** The accounts that a line could name. */
export const peopleOf = ({ actorId, subject }: DayBookEntry): readonly string[] =>
  [actorId, subject.kind === 'account' ? subject.id : null].filter((id) => id !== null);

const BY_STEWARDS: ReadonlySet<string> = new Set([...ACTS.roles, ...ACTS.accounts, ...ACTS.service]);

function whoDid(did: string, actorId: string | null, people: ReadonlyMap<string, Person>): Said {
  if (actorId === null) return { kind: 'site' };
  return BY_STEWARDS.has(did) ? { kind: 'steward' } : nameOf(people.get(actorId));
}

function nameOf(person: Person | undefined): Said {
  const isNamed = person !== undefined && rankOf(person.role) >= rankOf('editor') && ['open', 'leaving'].includes(person.state);
  return isNamed ? { kind: 'named', name: person.name } : { kind: 'former-editor' };
}

function changeIn(details: Json): ToldLine['change'] {
  if (details === null || typeof details !== 'object' || !('from' in details) || !('to' in details)) return null;
  const from = roleIn(details.from);
  const to = roleIn(details.to);
  return from === null || to === null ? null : { from, to };
}

function roleIn(value: Json | undefined): AccountRole | null {
  return ROLES.find((role): role is AccountRole => role !== 'reader' && role === value) ?? null;
}
