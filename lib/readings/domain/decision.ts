import { compare, product, whole, type Fraction } from '@/lib/kernel/fraction';
import type { Decision } from '@/lib/regions/domain/rule';
import { highest, isPoint, meanOf, scaled, type Span } from './amount';
import type { Figures } from './specimen';

export type Status = 'over' | 'test-more' | 'cannot-tell' | 'within';
export type Unclear = 'too-coarse' | 'at-limit';

/** How figures stand against one limit. `compared` is the figure that counts, in the limit's unit. */
export type Decided = { readonly status: Status; readonly reason: Unclear | null; readonly compared: Fraction | null };

type Side = 'within' | 'over' | Unclear;
type Held = Pick<Decision, 'kind' | 'specimens' | 'atLimit'> & { readonly limit: Fraction };

/** The worst first. */
const WORST: readonly Status[] = ['over', 'test-more', 'cannot-tell', 'within'];
/** Pieces that are tested more when the first lies between the limit and the ceiling. */
const FURTHER = 3;
const CEILING: Fraction = { numerator: 3n, denominator: 2n };

/** Holds figures against a limit by the rule of its sheet. */
export function decide(held: Held, { first, further }: Pick<Figures, 'first' | 'further'>): Decided {
  switch (held.kind) {
    case 'each':
      return decideEach(held, [...first, ...further]);
    case 'mean-of':
      return decideMean(held, [...first, ...further]);
    case 'first-then-three':
      return worst(first.map((span) => decideFirst(held, span, further)));
  }
}

/**
 * Where a figure lies. Exactly on the limit it goes by what the sheet says of that case. "Below" a value that is no higher
 * than the limit is within; "below" a higher one may lie on either side.
 */
function sideOf(span: Span, { limit, atLimit }: Pick<Held, 'limit' | 'atLimit'>): Side {
  const most = compare(span.most, limit);
  const least = compare(span.least, limit);
  if (least > 0 || (least === 0 && atLimit === 'over')) return 'over';
  if (most < 0) return 'within';
  if (isPoint(span)) return atLimit === 'unclear' ? 'at-limit' : atLimit;
  return most === 0 ? 'within' : 'too-coarse';
}

/** A figure that cannot be told does not stop the call for more pieces: they are needed whichever side it lies on. */
function decideEach(held: Held, spans: readonly Span[]): Decided {
  const sides = spans.map((span) => sideOf(span, held));
  const compared = highest(spans);
  if (sides.includes('over')) return { status: 'over', reason: null, compared };
  if (spans.length < held.specimens) return { status: 'test-more', reason: null, compared };
  const reason = sides.find((side) => side === 'at-limit' || side === 'too-coarse') ?? null;
  return { status: reason === null ? 'within' : 'cannot-tell', reason, compared };
}

function decideMean(held: Held, spans: readonly Span[]): Decided {
  const mean = meanOf(spans);
  if (mean === null) return { status: 'cannot-tell', reason: null, compared: null };
  if (spans.length < held.specimens) {
    const share = product(whole(BigInt(spans.length)), { numerator: 1n, denominator: BigInt(held.specimens) });
    const { least } = scaled(mean, share);
    const status = sideOf({ least, most: least }, held) === 'over' ? 'over' : 'test-more';
    return { status, reason: null, compared: mean.most };
  }
  return { ...statusOf(sideOf(mean, held)), compared: mean.most };
}

function decideFirst(held: Held, first: Span, further: readonly Span[]): Decided {
  const ceiling = { limit: product(held.limit, CEILING), atLimit: 'within' } as const;
  const side = sideOf(first, held);
  if (side !== 'over') return { ...statusOf(side), compared: first.most };
  const top = sideOf(first, ceiling);
  if (top === 'over') return { status: 'over', reason: null, compared: first.most };
  const decided = decideFurther(held, further, ceiling);
  const compared = further.length < FURTHER ? first.most : decided.compared;
  if (top === 'too-coarse' && decided.status !== 'over') return { status: 'cannot-tell', reason: 'too-coarse', compared };
  return { ...decided, compared };
}

/** The three or more that decide when the first lies between. The first is no part of their mean. */
function decideFurther(held: Held, further: readonly Span[], ceiling: Pick<Held, 'limit' | 'atLimit'>): Decided {
  const mean = meanOf(further);
  const compared = mean?.most ?? null;
  const tops = further.map((span) => sideOf(span, ceiling));
  if (tops.includes('over')) return { status: 'over', reason: null, compared };
  if (mean === null || further.length < FURTHER) return { status: 'test-more', reason: null, compared };
  const side = sideOf(mean, held);
  if (side === 'within' && tops.includes('too-coarse')) return { status: 'cannot-tell', reason: 'too-coarse', compared };
  return { ...statusOf(side), compared };
}

function statusOf(side: Side): Pick<Decided, 'status' | 'reason'> {
  return side === 'within' || side === 'over' ? { status: side, reason: null } : { status: 'cannot-tell', reason: side };
}

/** The worst of several first pieces; of two alike the higher figure. */
function worst(all: readonly Decided[]): Decided {
  const rank = ({ status }: Decided): number => WORST.indexOf(status);
  const isWorse = (a: Decided, b: Decided): boolean => rank(a) < rank(b) || (rank(a) === rank(b) && isHigher(a.compared, b.compared));
  return all.reduce((one, other) => (isWorse(other, one) ? other : one), { status: 'within', reason: null, compared: null });
}

const isHigher = (a: Fraction | null, b: Fraction | null): boolean => a !== null && (b === null || compare(a, b) > 0);
