const MINUTE_MS = 60_000;
const DAY_MS = 1440 * MINUTE_MS;

/** Unseen for that long, a session is over. */
export const IDLE_MS = 7 * DAY_MS;
/** Nothing lengthens a session beyond that. */
export const ABSOLUTE_MS = 30 * DAY_MS;
/** A visit is noted in the session's row at most that often. */
export const TOUCH_MS = 5 * MINUTE_MS;
/** For that long after the password was typed, delicate acts do not ask for it again. */
export const FRESH_MS = 10 * MINUTE_MS;
/** Between asking to leave and being forgotten. */
export const GRACE_MS = 14 * DAY_MS;

/** For how long each kind of mailed link can be used. */
export const TOKEN_MS = { confirm: 60 * MINUTE_MS, link: 15 * MINUTE_MS, reset: 60 * MINUTE_MS, address: 60 * MINUTE_MS } as const;
export type TokenKind = keyof typeof TOKEN_MS;

export const later = (from: Date, ms: number): Date => new Date(from.getTime() + ms);
export const earlier = (from: Date, ms: number): Date => new Date(from.getTime() - ms);
