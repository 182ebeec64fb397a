/** One code of an authenticator lasts that long. */
export const STEP_MS = 30_000;

/**
 * The step a code was made for, if it may be used: each step once, and none before one that was used. `delta` is how many steps
 * the code lies from now, null when it is none of the steps beside.
 */
export function usableStep(now: Date, delta: number | null, lastUsed: number | null): number | null {
  if (delta === null) return null;
  const step = Math.floor(now.getTime() / STEP_MS) + delta;
  return lastUsed === null || step > lastUsed ? step : null;
}
