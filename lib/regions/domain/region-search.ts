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

/** What a place is found by besides its own name and code: other names for it, in any language. */
export type OtherNames = Readonly<Record<string, string | readonly string[]>>;

type Named = Pick<ListedRegion, 'code' | 'name'>;

const wholeNames = ({ code, name }: Named, others: OtherNames): readonly string[] =>
  [name, code, ...[others[code] ?? []].flat()].map(foldText);
const wordsOf = (names: readonly string[]): readonly string[] => [...new Set(names.flatMap((name) => name.split(' ')))];

/**
 * Places found by a reader's words: each word begins a word of the place's name, of its code, of another name, or of those
 * of a layer above it, so that "eu" finds its members too. No words find every place.
 */
export function searchRegions(regions: readonly ListedRegion[], asked: string, others: OtherNames): readonly ListedRegion[] {
  const sought = foldText(asked)
    .split(' ')
    .filter((word) => word !== '');
  const said = new Map(regions.map((region) => [region.code, wordsOf(wholeNames(region, others))]));
  return regions.filter(({ line, code }) => {
    const known = [...new Set([...line, code])].flatMap((layer) => said.get(layer) ?? [layer]);
    return sought.every((word) => known.some((own) => own.startsWith(word)));
  });
}

/** Places, such as countries without a sheet, that go by a name which begins with what was asked. Nothing asked finds none. */
export function placesNamed<Place extends Named>(places: readonly Place[], asked: string, others: OtherNames): readonly Place[] {
  const sought = foldText(asked);
  if (sought.length < 2) return [];
  return places.filter((place) =>
    wholeNames(place, others).some((name) => name === sought || (sought.length > 2 && name.startsWith(sought))),
  );
}

/** Places whose name is at most two slips away from what was asked, the nearest first. For when nothing was found. */
export function nearestRegions<Place extends Named>(regions: readonly Place[], asked: string, others: OtherNames): readonly Place[] {
  const sought = foldText(asked);
  const most = sought.length > 5 ? 2 : 1;
  return regions
    .map((region) => {
      const names = wholeNames(region, others);
      return { region, slips: fewestSlips(sought, [...names, ...wordsOf(names)]) };
    })
    .filter(({ slips }) => slips <= most && sought.length > 2)
    .sort((a, b) => a.slips - b.slips)
    .slice(0, 5)
    .map(({ region }) => region);
}

const fewestSlips = (sought: string, names: readonly string[]): number => Math.min(...names.map((name) => slipsBetween(sought, name)));

/** Letters to add, drop, change or swap until one word is the other. */
export function slipsBetween(a: string, b: string): number {
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
