import { foldText } from '@/lib/regions/domain/region-search';
import { stem } from './stem';

/** A word as it stands in a text, and what it is compared by. */
export type ReadWord = { readonly folded: string; readonly stem: string; readonly from: number; readonly to: number };

const LONGEST = 40;

const PLAIN = /^[a-z0-9]+$/;

// Most words need no folding beyond their capitals.
function foldWord(said: string): string {
  const small = said.toLowerCase();
  return PLAIN.test(small) ? small : foldText(said).replaceAll(' ', '');
}

/** Every word of a text with its place in it. Linear in the text's length. */
export function readWords(text: string): readonly ReadWord[] {
  return [...text.matchAll(/[\p{L}\p{N}\p{M}]+/gu)].flatMap(({ 0: said, index }) => {
    const folded = foldWord(said).slice(0, LONGEST);
    return folded === '' ? [] : [{ folded, stem: stem(folded), from: index, to: index + said.length }];
  });
}
