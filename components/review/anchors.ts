import { words } from '@/lib/kernel/words';
import type { ItemDifference } from '@/lib/regions/domain/sheet-difference';
import type { ClaimToRead, Remark } from '@/lib/regions/domain/amendment-view';

/** An id of the page made from a key of the sheet: `rules/dk-register#0` becomes `claim-rules-dk-register-0`. */
const plain = (key: string): string => key.replaceAll(/[^a-z0-9-]+/gi, '-');
export const claimAnchor = (key: string): string => `claim-${plain(key)}`;
export const remarksAnchor = (line: string): string => `remarks-${plain(line)}`;

const WHOLE = 'place';

/** The lines of a changed item that remarks can be tied to: the item itself, or of the sheet the parts that differ. */
export function linesOf({ list, id, fields }: ItemDifference): readonly string[] {
  switch (list) {
    case 'rules':
    case 'terms':
    case 'sources':
    case 'trials':
    case 'memberships':
      return [`${list}/${id}`];
    case 'sheet': {
      const parts = fields.map(({ field }) => (field === 'text' || field === 'gaps' ? field : WHOLE));
      return [...new Set(parts)];
    }
    // Contacts and what was left out go by no key of their own: they are remarked on with the sheet.
    case 'authorities':
    case 'accreditation':
    case 'leftOut':
      return [];
  }
}

/** What a line is called, by its key: of an item its title, of a claim the item and which source of it. */
export type LineNames = ReadonlyMap<string, string>;

export function namesOfLines(items: readonly ItemDifference[], claims: readonly ClaimToRead[]): LineNames {
  const ofItems = items.flatMap((item) => linesOf(item).map((line) => [line, lineName(item, line)] as const));
  const ofClaims = claims.map(({ key, title }) => [key, words('review.remark.claim', { number: numberIn(key), title })] as const);
  return new Map([...ofItems, ...ofClaims]);
}

function lineName({ list, title }: ItemDifference, line: string): string {
  if (list !== 'sheet') return title;
  return line === 'text' || line === 'gaps' ? words(`editions.field.${line}`) : words('review.remark.whole');
}

/** Which of its item's sources a claim cites, counted from one. */
const numberIn = (key: string): number => Number(key.split('#')[1] ?? 0) + 1;

/** Remarks by the line they are tied to. */
export function remarksByLine(remarks: readonly Remark[]): ReadonlyMap<string, readonly Remark[]> {
  const lines = new Map<string, readonly Remark[]>();
  for (const remark of remarks) lines.set(remark.line, [...(lines.get(remark.line) ?? []), remark]);
  return lines;
}
