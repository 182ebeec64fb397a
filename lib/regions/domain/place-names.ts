import { LOCALE } from '@/lib/kernel/words';

const COUNTRY = /^[a-z]{2}$/;
const known = new Map<string, Intl.DisplayNames>();

function namesIn(language: string): Intl.DisplayNames {
  const found = known.get(language) ?? new Intl.DisplayNames([language], { type: 'region', fallback: 'none' });
  known.set(language, found);
  return found;
}

/** The language most spoken in a country, by Unicode's likely subtags: for places whose languages no sheet tells. */
export function likelyLanguage(code: string): string {
  return COUNTRY.test(code) ? new Intl.Locale('und', { region: code.toUpperCase() }).maximize().language : LOCALE;
}

/**
 * Every name a place goes by: in its own languages, in English, and those that people use besides. Only countries and the European
 * Union have names in other languages; other blocs, parts and standards go by what is given.
 */
export function namesOfPlace(code: string, given: { readonly languages: readonly string[]; readonly also: readonly string[] }): string[] {
  const languages = COUNTRY.test(code) ? [LOCALE, ...given.languages] : [];
  const said = languages.flatMap((language) => namesIn(language).of(code.toUpperCase()) ?? []);
  return [...new Set([...said, ...given.also])];
}
