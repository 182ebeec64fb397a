import { compare, difference, numberOf, ratio, readFraction, sum, whole, type Fraction } from '@/lib/kernel/fraction';
import { err, ok, type Result } from '@/lib/kernel/result';

/** A figure with the uncertainty its lab gives, all in the unit of the limit. */
export type UncertainFigure = {
  readonly value: number | string;
  /** U, the figure after "plus or minus". */
  readonly expandedUncertainty: number | string;
  /** k; labs use 2 for about 95 %. */
  readonly coverageFactor: number | string;
  readonly limit: number | string;
};

export type GuardFault = 'not-an-amount' | 'no-uncertainty' | 'not-a-factor';

/** Never a verdict: whether the figure stands clear of the limit by more than the lab's own doubt. */
export type Clearance = 'clearly-under' | 'too-close-to-tell' | 'clearly-over';

export type GuardedComparison = {
  readonly clearance: Clearance;
  /** The limit less the guard band, which is U. At most this much is clearly under. */
  readonly acceptanceLimit: number;
  /** More than this is clearly over. */
  readonly rejectionLimit: number;
  /** The chance that the true figure is at most the limit, for a bell-shaped uncertainty. */
  readonly chanceUnder: number;
  /** Without it no figure above zero could be clearly under: the method is too coarse for this limit. */
  readonly canTellUnder: boolean;
};

const ZERO = whole(0n);
const PLACES = 12;

/** Guarded comparison with an upper limit (JCGM 106, guard band w = U). On the acceptance limit counts as under, as in ILAC-G8. */
export function guardedComparison(figure: UncertainFigure): Result<GuardedComparison, GuardFault> {
  const [value, limit] = [amount(figure.value), amount(figure.limit)];
  const [guard, factor] = [amount(figure.expandedUncertainty), amount(figure.coverageFactor)];
  if (value === null || limit === null || guard === null) return err('not-an-amount');
  if (factor === null || compare(factor, ZERO) === 0) return err('not-a-factor');
  const standardUnits = ratio(difference(limit, value), guard);
  if (standardUnits === null) return err('no-uncertainty');
  const [under, over] = [difference(limit, guard), sum(limit, guard)];
  return ok({
    clearance: clearanceOf(value, under, over),
    acceptanceLimit: numberOf(under, PLACES),
    rejectionLimit: numberOf(over, PLACES),
    chanceUnder: normalShare(numberOf(standardUnits, PLACES) * numberOf(factor, PLACES)),
    canTellUnder: compare(under, ZERO) > 0,
  });
}

function amount(value: number | string): Fraction | null {
  const read = readFraction(value);
  return read === null || compare(read, ZERO) < 0 ? null : read;
}

function clearanceOf(value: Fraction, under: Fraction, over: Fraction): Clearance {
  if (compare(value, under) <= 0) return 'clearly-under';
  return compare(value, over) > 0 ? 'clearly-over' : 'too-close-to-tell';
}

/** Beyond this many standard uncertainties nothing is left to count. */
const FAR = 8;

/** The share of a normal distribution below `z`, by the series z + z³/3 + z⁵/(3·5) + … */
export function normalShare(z: number): number {
  if (z <= -FAR) return 0;
  if (z >= FAR) return 1;
  let [term, all, odd] = [z, z, 1];
  while (Math.abs(term) > 1e-17) {
    odd += 2;
    term *= (z * z) / odd;
    all += term;
  }
  return Math.min(1, Math.max(0, 0.5 + (all * Math.exp((-z * z) / 2)) / Math.sqrt(2 * Math.PI)));
}
