import type { ListedRegion } from './listed-region';

/** Letters that no decomposition takes apart. */
const LETTERS: Readonly<Record<string, string>> = { ø: 'o', æ: 'ae', œ: 'oe', ß: 'ss', ł: 'l', đ: 'd', ð: 'd', þ: 'th', ı: 'i' };

/** Text without accents, capitals and signs, its words apart by one space: "Côte d'Ivoire" and "cote d ivoire" are the same. */
export function foldText(text: string): string {
  return text
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/[øæœßłđðþı]/g, (letter) => LETTERS[letter] ?? letter)
    .replace(/[^\p{L}\p{N}]+/gu, ' ')
    .trim();
}

/** What a place is found by besides its own name and code: other names for it. */
export type OtherNames = Readonly<Record<string, string>>;

const namesOfPlace = ({ code, name }: Pick<ListedRegion, 'code' | 'name'>, others: OtherNames): string =>
  foldText([name, code, others[code] ?? ''].join(' '));

/**
 * Places found by a reader's words: each word begins a word of the place's name, of its code, of another name, or of those
 * of a layer above it, so that "eu" finds its members too. No words find every place.
 */
export function searchRegions(regions: readonly ListedRegion[], asked: string, others: OtherNames): readonly ListedRegion[] {
  const sought = foldText(asked)
    .split(' ')
    .filter((word) => word !== '');
  const said = new Map(regions.map((region) => [region.code, namesOfPlace(region, others)]));
  return regions.filter(({ line, code }) => {
    const known = [...new Set([...line, code])]
      .map((layer) => said.get(layer) ?? layer)
      .join(' ')
      .split(' ');
    return sought.every((word) => known.some((own) => own.startsWith(word)));
  });
}

/** Places whose name is at most two slips away from what was asked, the nearest first. For when nothing was found. */
export function nearestRegions(regions: readonly ListedRegion[], asked: string, others: OtherNames): readonly ListedRegion[] {
  const sought = foldText(asked);
  const most = sought.length > 5 ? 2 : 1;
  return regions
    .map((region) => ({ region, slips: fewestSlips(sought, [foldText(region.name), ...namesOfPlace(region, others).split(' ')]) }))
    .filter(({ slips }) => slips <= most && sought.length > 2)
    .sort((a, b) => a.slips - b.slips)
    .slice(0, 5)
    .map(({ region }) => region);
}

const fewestSlips = (sought: string, names: readonly string[]): number => Math.min(...names.map((name) => slipsBetween(sought, name)));

/** Letters to add, drop, change or swap until one word is the other. */
function slipsBetween(a: string, b: string): number {
  if (Math.abs(a.length - b.length) > 2) return Infinity;
  let before: number[] = [];
  let last = Array.from({ length: b.length + 1 }, (_, place) => place);
  for (let row = 1; row <= a.length; row += 1) {
    const now = [row];
    for (let column = 1; column <= b.length; column += 1) {
      const changed = at(last, column - 1) + (a[row - 1] === b[column - 1] ? 0 : 1);
      const swapped = isSwap([a, row], [b, column]) ? at(before, column - 2) + 1 : Infinity;
      now.push(Math.min(at(last, column) + 1, at(now, column - 1) + 1, changed, swapped));
    }
    before = last;
    last = now;
  }
  return at(last, b.length);
}

/** The two letters before these places are the same, the other way round. */
const isSwap = ([a, row]: readonly [string, number], [b, column]: readonly [string, number]): boolean =>
  row > 1 && column > 1 && a[row - 1] === b[column - 2] && a[row - 2] === b[column - 1];

const at = (row: readonly number[], place: number): number => row[place] ?? Infinity;
