/** Days a check stays at its address after it was last touched, unless someone keeps it. */
export const DAYS_KEPT = 30;

const DAY_MS = 86_400_000;

/** Checks last touched before this instant are gone. */
export const keptSince = (now: Date): Date => new Date(now.getTime() - DAYS_KEPT * DAY_MS);

/** Until when a check last touched at that instant stays. */
export const keptUntil = (touchedAt: Date): Date => new Date(touchedAt.getTime() + DAYS_KEPT * DAY_MS);
