/** What a name may not be: it would read as if the site itself, or its office, were speaking. */
const RESERVED = ['footring', 'steward', 'moderator', 'administrator', 'admin', 'support', 'former editor', 'a former editor', 'system'];

const LONGEST = 80;
// Letters of other scripts and digits that read as the Latin ones: enough to see through a look-alike of a reserved name.
const LOOKS_LIKE: Readonly<Record<string, string>> = {
  а: 'a',
  ɑ: 'a',
  α: 'a',
  е: 'e',
  ε: 'e',
  о: 'o',
  ο: 'o',
  р: 'p',
  ρ: 'p',
  с: 'c',
  ѕ: 's',
  і: 'i',
  ı: 'i',
  ι: 'i',
  т: 't',
  τ: 't',
  м: 'm',
  н: 'h',
  ԁ: 'd',
  ո: 'n',
  ѡ: 'w',
  '0': 'o',
  '1': 'i',
  '3': 'e',
  '5': 's',
  $: 's',
};

export type NameFault = 'empty' | 'too-long' | 'reserved';

/** A name as it is kept: NFC, without marks that nobody sees or that turn the direction of reading, single blanks. */
export function tidyName(text: string): string {
  return text
    .slice(0, LONGEST * 10)
    .normalize('NFC')
    .replace(/[\p{Cc}\p{Cf}\p{Cs}\p{Co}\p{Zl}\p{Zp}\u115f\u1160\u3164\uffa0\u2800]/gu, ' ')
    .replace(/\p{Z}+/gu, ' ')
    .trim();
}

/** What is wrong with a tidied name, or null. */
export function nameFault(name: string): NameFault | null {
  if (name === '') return 'empty';
  if (name.length > LONGEST) return 'too-long';
  return RESERVED.includes(skeletonOf(name)) ? 'reserved' : null;
}

/** The name as a reader's eye takes it: accents and case gone, look-alikes read as what they look like. */
function skeletonOf(name: string): string {
  const plain = name.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase();
  return Array.from(plain, (letter) => LOOKS_LIKE[letter] ?? letter)
    .join('')
    .replace(/[\s._-]+/g, ' ')
    .trim();
}
