/** What went wrong in words for the person at the keyboard, who can do something about it: printed without a stack. */
export class Trouble extends Error {}

// Whoever reads our output may leave (`npm start | head`); that is no reason to leave a database behind.
process.stdout.on('error', () => undefined);
process.stderr.on('error', () => undefined);

/** Prints one line. */
export function say(line = '') {
  process.stdout.write(`${line}\n`);
}

/** Milliseconds as a reader likes them: "0.4 s", "64 s", "3 min 5 s". */
export function duration(ms) {
  if (ms < 9_950) return `${(ms / 1000).toFixed(1)} s`;
  const seconds = Math.round(ms / 1000);
  return seconds < 120 ? `${seconds} s` : `${Math.floor(seconds / 60)} min ${seconds % 60} s`;
}

/** Names a piece of work, does it, and says how long it took. */
export async function during(title, work) {
  process.stdout.write(`${title} … `);
  const began = Date.now();
  try {
    const result = await work();
    say(duration(Date.now() - began));
    return result;
  } catch (error) {
    say('no');
    throw error;
  }
}

/** Tells the reader about an error: a Trouble in its own words, anything else with its stack, since that is a fault of ours. */
export function tell(error) {
  process.stderr.write(`\n${error instanceof Trouble ? error.message : (error?.stack ?? String(error))}\n`);
}
