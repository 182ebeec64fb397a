import { product, ratio, whole, type Fraction } from '@/lib/kernel/fraction';
import type { Extract, Part } from './reading';
import type { Per } from './unit';

/** What an amount is per, and of which part. */
export type Basis = { readonly per: Per; readonly part: Part };

const LITRE: Fraction = { numerator: 1n, denominator: 1000n };
const SQUARE_DECIMETRE: Fraction = { numerator: 1n, denominator: 100n };

/**
 * By what an amount in milligrams per `from` is multiplied to be in milligrams per `to`: times the reading's own extract, which
 * gives a mass, over the extract that the limit is per. Null where an extract that is needed was not given: the capacity of
 * the piece never stands in, since nobody fills to the brim. A content is never converted into a release, nor the other way.
 */
export function scaleBetween(from: Basis, to: Basis, extracts: readonly Extract[]): Fraction | null {
  if (from.per === to.per && (from.part === to.part || from.per === 'article')) return whole(1n);
  const mass = sizeOf(from, extracts);
  const share = sizeOf(to, extracts);
  return mass === null || share === null ? null : ratio(mass, share);
}

/** Litres, square decimetres, or one piece. */
function sizeOf({ per, part }: Basis, extracts: readonly Extract[]): Fraction | null {
  const { volumeMl, areaCm2 } = extracts.find((one) => one.part === part) ?? { volumeMl: null, areaCm2: null };
  switch (per) {
    case 'article':
      return whole(1n);
    case 'L':
      return volumeMl === null ? null : product(volumeMl, LITRE);
    case 'dm2':
      return areaCm2 === null ? null : product(areaCm2, SQUARE_DECIMETRE);
    case 'kg':
      return null;
  }
}
