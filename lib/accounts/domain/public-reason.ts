const WORD = /[\p{L}\p{N}]+/gu;
const ADDRESS = /[^\s@]@[^\s@]+\.[^\s@]/u;

const wordsOf = (text: string): string => ` ${(text.normalize('NFKC').toLowerCase().match(WORD) ?? []).join(' ')} `;

/**
 * Whether a reason that everybody will read tells who it is about: by the person's whole name, or by an e-mail address. It sees what
 * slips in, not what somebody hides.
 */
export function namesPerson(reason: string, name: string): boolean {
  if (ADDRESS.test(reason)) return true;
  const said = wordsOf(name);
  return said.trim() !== '' && wordsOf(reason).includes(said);
}
