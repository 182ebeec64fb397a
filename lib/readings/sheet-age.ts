/** Days a sheet of readings stays at its address after it was sent. */
export const SHEET_DAYS = 30;

const DAY_MS = 86_400_000;

/** Sheets sent before this instant are gone. */
export const sheetsSince = (now: Date): Date => new Date(now.getTime() - SHEET_DAYS * DAY_MS);

/** Until when a sheet sent at that instant stays. */
export const sheetUntil = (touchedAt: Date): Date => new Date(touchedAt.getTime() + SHEET_DAYS * DAY_MS);
