import { compare, numberOf, product, quotient, readFraction, sum, whole, type Fraction } from '@/lib/kernel/fraction';
import { err, ok, type Result } from '@/lib/kernel/result';

export type SampleFault = 'not-a-count' | 'not-a-share';

/** One-sided confidence of the bound, and the chance of being wrong that it leaves. */
const LEFT_OVER = 0.05;
const MOST_SPECIMENS = 1_000_000;

const isCount = (value: number): boolean => Number.isInteger(value) && value >= 1 && value <= MOST_SPECIMENS;
const isShare = (value: number): boolean => value >= 0 && value <= 1;

/** What it shows about all the pieces made alike when every specimen tested was under the limit. Shares from 0 to 1. */
export type CleanSpecimens = {
  /** With 95 % confidence at most this share of the pieces is over: 1 − 0.05^(1/n). */
  readonly shareOverAtMost: number;
  /** 3/n, the rule of thumb: close for many specimens, far too high for few; never shown above 1. */
  readonly ruleOfThree: number;
};

/** Zero-acceptance sampling. The specimens must be picked at random from pieces made alike; else it shows nothing. */
export function cleanSpecimens(count: number): Result<CleanSpecimens, SampleFault> {
  if (!isCount(count)) return err('not-a-count');
  return ok({ shareOverAtMost: 1 - LEFT_OVER ** (1 / count), ruleOfThree: Math.min(1, 3 / count) });
}

/** How many specimens, all under the limit, show with 95 % confidence that at most this share of the pieces is over. */
export function specimensNeeded(share: number): Result<number, SampleFault> {
  if (!(share > 0 && share < 1)) return err('not-a-share');
  const needed = Math.ceil(Math.log(LEFT_OVER) / Math.log1p(-share));
  return needed > MOST_SPECIMENS ? err('not-a-share') : ok(Math.max(1, needed));
}

/** The chance that at least one of so many specimens is over, when this share of all the pieces is. */
export function chanceOfOneOver(share: number, count: number): Result<number, SampleFault> {
  if (!isShare(share)) return err('not-a-share');
  return isCount(count) ? ok(1 - (1 - share) ** count) : err('not-a-count');
}

/** One figure of a lab; `below` where it reports no more than "less than this". */
export type Figure = { readonly value: number | string; readonly below?: boolean };

/** Mean, highest figure and how many lie over a limit, exactly; means of "less than" figures between their ends. */
export type Spread = {
  /** "Less than" figures counted as zero, as half, and as the whole of what they are less than. */
  readonly mean: { readonly lower: number; readonly middle: number; readonly upper: number };
  readonly highest: number;
  readonly belowCount: number;
  /** Figures certainly over the limit. A "less than" figure is never one. */
  readonly overCount: number;
};

type ReadFigure = { readonly exact: Fraction; readonly below: boolean };

const ZERO = whole(0n);
const HALF = quotient(1n, 2n) ?? ZERO;
const PLACES = 12;

/** Sums up the figures of several specimens. Null when one is no amount, or there is none. */
export function spreadOf(figures: readonly Figure[], limit: number | string): Spread | null {
  const border = readFraction(limit);
  const read = figures.flatMap(({ value, below = false }): readonly ReadFigure[] => {
    const exact = readFraction(value);
    return exact === null || compare(exact, ZERO) < 0 ? [] : [{ exact, below }];
  });
  if (border === null || read.length === 0 || read.length < figures.length) return null;
  const highest = read.reduce((most, { exact }) => (compare(exact, most) > 0 ? exact : most), ZERO);
  return {
    mean: { lower: meanOf(read, ZERO), middle: meanOf(read, HALF), upper: meanOf(read, whole(1n)) },
    highest: numberOf(highest, PLACES),
    belowCount: read.filter(({ below }) => below).length,
    overCount: read.filter(({ exact, below }) => !below && compare(exact, border) > 0).length,
  };
}

/** `part`: how much of a "less than" figure is counted. */
function meanOf(read: readonly ReadFigure[], part: Fraction): number {
  const all = read.reduce((so, { exact, below }) => sum(so, below ? product(exact, part) : exact), ZERO);
  return numberOf(product(all, quotient(1n, BigInt(read.length)) ?? ZERO), PLACES);
}
