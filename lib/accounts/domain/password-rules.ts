/** In characters as a person counts them; a passphrase of any kind is welcome, and nothing is asked of its kinds of characters. */
export const SHORTEST_PASSWORD = 8;
/** Beyond this a password adds nothing but work for the server. */
export const LONGEST_PASSWORD = 1000;

export type PasswordFault = 'too-short' | 'too-long' | 'common' | 'own-words';

/** The same characters typed on another keyboard are the same password. */
export const readPassword = (text: string): string => text.normalize('NFKC');

/**
 * What is wrong with a new password, or null. `common` holds those many people use, in lower case; `own` what anyone
 * would try first for this person: the name and the address.
 */
export function passwordFault(password: string, common: ReadonlySet<string>, own: readonly string[]): PasswordFault | null {
  const length = Array.from(password).length;
  if (length < SHORTEST_PASSWORD) return 'too-short';
  if (length > LONGEST_PASSWORD) return 'too-long';
  const lower = password.toLowerCase();
  if (common.has(lower)) return 'common';
  return own.some((word) => word.toLowerCase() === lower) ? 'own-words' : null;
}
