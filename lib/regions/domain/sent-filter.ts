import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { isWaiting, AMENDMENT_STATES, type AmendmentState } from './amendment';

/** What a moderator asks the sorting table for. */
export type SentQuery = {
  readonly region?: string | undefined;
  readonly state?: AmendmentState | undefined;
  /** Waiting for at least so many days. */
  readonly days?: number | undefined;
  /** Sent before this day. */
  readonly until?: CalendarDate | undefined;
};

export type SentStates = {
  readonly states: readonly AmendmentState[];
  readonly region: string | undefined;
  /** Sent before this instant. */
  readonly before: Date | undefined;
};

const DAY_MS = 86_400_000;

/** The same as states and instants; without a state, those that wait. */
export function sentFilter({ region, state, days, until }: SentQuery, now: Date): SentStates {
  const instants = [
    ...(days === undefined ? [] : [now.getTime() - days * DAY_MS + 1]),
    ...(until === undefined ? [] : [Date.parse(`${until}T00:00:00Z`)]),
  ];
  return {
    states: state === undefined ? AMENDMENT_STATES.filter(isWaiting) : [state],
    region,
    before: instants.length === 0 ? undefined : new Date(Math.min(...instants)),
  };
}
