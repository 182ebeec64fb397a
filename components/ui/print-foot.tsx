import type { ReactElement } from 'react';

/** As a CSS string, whatever it holds: all but letters, digits and spaces by number. */
const cssString = (text: string): string =>
  text.replace(/[^\p{L}\p{N} ]/gu, (sign) => `\\${(sign.codePointAt(0) ?? 0xfffd).toString(16)} `);

/** The running foot of a printed page: its words at the start, the page's number at the end. */
export function PrintFoot({ said }: { readonly said: string }): ReactElement {
  return <style>{`@page{@bottom-left{content:"${cssString(said)}"}@bottom-right{content:counter(page) "/" counter(pages)}}`}</style>;
}
