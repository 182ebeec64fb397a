/** Letters and digits that cannot be taken for one another when read from paper. */
const LETTERS = '23456789abcdefghjkmnpqrstuvwxyz';

export const CODES_GIVEN = 10;
/** 12 characters of 31 hold 59 bits. */
export const CODE_LENGTH = 12;

/** "k7m2-9xqd-4tnb" out of random bytes; those beyond the last whole round of letters are passed over, so that all are equally likely. */
export function writeRecoveryCode(random: Uint8Array): string | null {
  const fit = [...random].filter((byte) => byte < 248).slice(0, CODE_LENGTH);
  if (fit.length < CODE_LENGTH) return null;
  const text = fit.map((byte) => LETTERS.charAt(byte % LETTERS.length)).join('');
  return text.replace(/(.{4})(?=.)/g, '$1-');
}

/** A code as it was typed, without what people put between its parts. */
export const readRecoveryCode = (text: string): string => text.normalize('NFKC').toLowerCase().replace(/[\s-]/g, '');
