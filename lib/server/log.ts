type Fields = Readonly<Record<string, unknown>>;
type Level = 'info' | 'warn' | 'error';

const DEEPEST_CAUSE = 5;
// Beyond what JSON escapes by itself: DEL, C1 controls, line separators, and marks that reorder what a reader sees.
const UNSEEN = /[\u007f-\u009f\u200e\u200f\u2028-\u202e\u2066-\u2069]/g;

const escaped = (character: string): string => `\\u${character.charCodeAt(0).toString(16).padStart(4, '0')}`;

function sayError(error: unknown, depth = 0): unknown {
  if (!(error instanceof Error)) return error;
  const { name, message, stack, cause } = error;
  const said = { name, message, stack };
  return cause === undefined || depth >= DEEPEST_CAUSE ? said : { ...said, cause: sayError(cause, depth + 1) };
}

/** One line of JSON. What cannot be written as JSON (a loop, a bigint) is said as text, so that logging never throws. */
export function logLine(level: Level, fields: Fields, at: Date): string {
  const plain = Object.fromEntries(Object.entries(fields).map(([key, value]) => [key, sayError(value)]));
  try {
    return JSON.stringify({ at: at.toISOString(), level, ...plain }).replace(UNSEEN, escaped);
  } catch (error) {
    return JSON.stringify({ at: at.toISOString(), level, unwritable: String(error) }).replace(UNSEEN, escaped);
  }
}

const write =
  (level: Level) =>
  (fields: Fields): void => {
    process.stdout.write(`${logLine(level, fields, new Date())}\n`);
  };

/** The log: one JSON line an entry, to standard output. Never give it answers, tokens, addresses of people or passwords. */
export const log = { info: write('info'), warn: write('warn'), error: write('error') };
