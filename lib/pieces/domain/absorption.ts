import { compare, difference, numberOf, product, ratio, readFraction, whole, type Fraction } from '@/lib/kernel/fraction';
import { err, ok, type Result } from '@/lib/kernel/result';

/** Three weighings of one specimen, in grams: dry, hanging in water, and full of water with its surface blotted. */
export type Weighings = {
  readonly dry: number | string;
  readonly suspended: number | string;
  readonly saturated: number | string;
};

export type Weighing = keyof Weighings;

export type WeighingFault =
  | { readonly kind: 'not-a-weight'; readonly weighing: Weighing }
  | { readonly kind: 'dry-not-above-zero' | 'saturated-under-dry' | 'suspended-not-under-dry' };

/** By the formulas of ASTM C373 (from memory), water taken as 1 g/cm³. Numbers at six decimals, where amounts are compared. */
export type Absorption = {
  readonly exteriorVolumeCm3: number;
  readonly absorptionPercent: number;
  readonly apparentPorosityPercent: number;
  readonly bulkDensity: number;
  readonly apparentSpecificGravity: number;
};

const HUNDRED = whole(100n);
const ZERO = whole(0n);
const PLACES = 6;

/** Water absorption, apparent porosity and densities; a refusal where the weights cannot belong to one specimen. */
export function absorptionOf({ dry, suspended, saturated }: Weighings): Result<Absorption, WeighingFault> {
  const [d, s, m] = [weight(dry), weight(suspended), weight(saturated)];
  if (d === null) return err({ kind: 'not-a-weight', weighing: 'dry' });
  if (s === null) return err({ kind: 'not-a-weight', weighing: 'suspended' });
  if (m === null) return err({ kind: 'not-a-weight', weighing: 'saturated' });
  if (compare(d, ZERO) === 0) return err({ kind: 'dry-not-above-zero' });
  if (compare(m, d) < 0) return err({ kind: 'saturated-under-dry' });
  return computed(d, s, m);
}

function weight(value: number | string): Fraction | null {
  const read = readFraction(value);
  return read === null || compare(read, ZERO) < 0 ? null : read;
}

function computed(dry: Fraction, suspended: Fraction, saturated: Fraction): Result<Absorption, WeighingFault> {
  const volume = difference(saturated, suspended);
  const water = product(HUNDRED, difference(saturated, dry));
  const gravity = ratio(dry, difference(dry, suspended));
  const [absorption, porosity, density] = [ratio(water, dry), ratio(water, volume), ratio(dry, volume)];
  if (gravity === null || compare(gravity, ZERO) <= 0 || absorption === null || porosity === null || density === null) {
    return err({ kind: 'suspended-not-under-dry' });
  }
  return ok({
    exteriorVolumeCm3: numberOf(volume, PLACES),
    absorptionPercent: numberOf(absorption, PLACES),
    apparentPorosityPercent: numberOf(porosity, PLACES),
    bulkDensity: numberOf(density, PLACES),
    apparentSpecificGravity: numberOf(gravity, PLACES),
  });
}

/** What the US tariff note calls a body, as far as absorption goes. Porcelain must also be white and let light through. */
export type TariffBody = 'porcelain-possible' | 'stoneware' | 'earthenware';

/** By absorption alone, each limit inclusive (tariff note from memory). */
export function usTariffBody(absorptionPercent: number): TariffBody {
  if (absorptionPercent <= 0.5) return 'porcelain-possible';
  return absorptionPercent <= 3 ? 'stoneware' : 'earthenware';
}
