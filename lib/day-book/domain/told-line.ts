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
  /** The code of the place a line on a sheet is about. */
  readonly region: string | null;
  /** The number of the edition that came of it. */
  readonly edition: number | null;
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
    region: textIn(details, 'region'),
    edition: numberIn(details, 'edition'),
    reason,
  };
}

/** The accounts that a line could name. */
export const peopleOf = ({ actorId, subject }: DayBookEntry): readonly string[] =>
  [actorId, subject.kind === 'account' ? subject.id : null].filter((id) => id !== null);

const BY_STEWARDS: ReadonlySet<string> = new Set([...ACTS.roles, ...ACTS.accounts, ...ACTS.service]);

function whoDid(did: string, actorId: string | null, people: ReadonlyMap<string, Person>): Said {
  if (actorId === null) return { kind: 'site' };
  return BY_STEWARDS.has(did) ? { kind: 'steward' } : sayActor(people.get(actorId));
}

/** How somebody is spoken of who acted: editors and moderators by the name of today, stewards by their role, others by what they were. */
export function sayActor(person: Person | undefined): Said {
  const said = nameOf(person);
  return said.kind === 'named' && person?.role === 'steward' ? { kind: 'steward' } : said;
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

function detailOf(details: Json, name: string): Json | undefined {
  return details === null || typeof details !== 'object' || Array.isArray(details)
    ? undefined
    : Object.entries(details).find(([key]) => key === name)?.[1];
}

function textIn(details: Json, name: string): string | null {
  const value = detailOf(details, name);
  return typeof value === 'string' ? value : null;
}

function numberIn(details: Json, name: string): number | null {
  const value = detailOf(details, name);
  return typeof value === 'number' ? value : null;
}
