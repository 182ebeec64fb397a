import { log } from './log';

const hasNumber = (said: unknown): boolean => said instanceof Error && 'digest' in said;

/** A person looking at a terminal gets colours; a log has no use for them. */
const plain = (said: unknown): unknown => (typeof said === 'string' ? said.replace(/\u001b\[\d+m/g, '') : said);

/**
 * What the framework reports on the console becomes lines of our log: it would print faults over many lines, with every field of an error,
 * and the driver keeps the whole statement in one of them. Errors with a number were logged under it already. Called once at the start.
 */
export function logConsole(): void {
  const into =
    (write: typeof log.error) =>
    (...said: unknown[]): void => {
      if (said.some(hasNumber)) return;
      const error = said.find((one) => one instanceof Error);
      const words = said.filter((one) => one !== error).map((one) => String(plain(one)));
      write({ doing: 'framework', words, ...(error === undefined ? {} : { error }) });
    };
  Reflect.set(globalThis.console, 'error', into(log.error));
  Reflect.set(globalThis.console, 'warn', into(log.warn));
}
