/** British spelling brought to American: whole words, beginnings and ends. What it makes need be no word, only always the same one. */
const SPELLED: readonly (readonly [RegExp, string])[] = [
  [/^(col|od|vap|fav|lab)our/, '$1or'],
  [/^mould/, 'mold'],
  [/^sulph/, 'sulf'],
  [/^aluminium/, 'aluminum'],
  [/^grey/, 'gray'],
  [/^licence/, 'license'],
  [/programme$/, 'program'],
  [/([bt])re$/, '$1er'],
  [/ogue$/, 'og'],
  [/is(e|ed|ing|ation)$/, 'iz$1'],
];

const VOWEL = /[aeiouy]/;
const SHORTEST = 3;

function withoutPlural(word: string): string {
  if (/[^aeiou]ies$/.test(word)) return `${word.slice(0, -3)}y`;
  if (/(?:ss|[xz]|[cs]h)es$/.test(word)) return word.slice(0, -2);
  return /[^su]s$/.test(word) && !word.endsWith('is') ? word.slice(0, -1) : word;
}

function withoutEnding(word: string): string {
  const ending = ['ation', 'ing', 'ed'].find((one) => word.endsWith(one));
  if (ending === undefined) return word;
  const rest = word.slice(0, -ending.length);
  return rest.length >= SHORTEST && VOWEL.test(rest) ? rest : word;
}

const undoubled = (word: string): string => (/([^aeiou\d])\1$/.test(word) ? word.slice(0, -1) : word);
const withoutE = (word: string): string => (word.length > SHORTEST && word.endsWith('e') ? word.slice(0, -1) : word);

/** The part of a folded word that its forms have in common: glaze, glazed, glazing, glazes; colour and color; litre and liter. */
export function stem(word: string): string {
  if (word.length <= SHORTEST || /\d/.test(word)) return word;
  const spelled = SPELLED.reduce((said, [pattern, instead]) => said.replace(pattern, instead), withoutPlural(word));
  return withoutE(undoubled(withoutEnding(spelled)));
}
