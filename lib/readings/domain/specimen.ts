import { product, ratio, type Fraction } from '@/lib/kernel/fraction';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { LimitPayload } from '@/lib/regions/domain/rule';
import { added, scaled, spanOf, type Span } from './amount';
import { scaleBetween, type Basis } from './extract';
import type { Part, Reading, Report } from './reading';
import { factorOf, perOf } from './unit';

/** The part of a piece a limit is about, in the words of readings. A metal fitting is none of the parts that are read. */
export type LimitedPart = Part | 'metal-part';

const PART: Readonly<Record<LimitPayload['part'], LimitedPart>> = {
  inside: 'vessel',
  rim: 'rim',
  article: 'content',
  glaze: 'content',
  'metal-part': 'metal-part',
};

export const limitedPart = ({ part }: Pick<LimitPayload, 'part'>): LimitedPart => PART[part];

/** Sheets after whose rule what a lid gives off is added to its vessel: mass to mass, over the vessel's own volume or area. */
const LIDS_ADDED: ReadonlySet<string> = new Set(['eu', 'de', 'fr', 'gb', 'tr']);

export const addsLids = (sheet: string, limit: Pick<LimitPayload, 'part'>): boolean => LIDS_ADDED.has(sheet) && limit.part === 'inside';

/** Figures in the limit's unit, one a specimen. */
export type Figures = { readonly first: readonly Span[]; readonly further: readonly Span[] };

export type LimitOf = Pick<LimitPayload, 'substance' | 'part' | 'per' | 'amount' | 'decision'>;

/**
 * The figures of a report that a limit speaks of. Further pieces are pieces of their own, even where a lab begins to count
 * them anew. A limit on the content of the glaze is not held against the content of the whole piece.
 */
export function figuresFor(limit: LimitOf, report: Report, lids: 'added' | 'apart'): Result<Figures, 'not-measured' | 'needs-conversion'> {
  const { first, further } = readingsFor(limit, report);
  const counted = limit.decision.kind === 'first-then-three' ? first : [...first, ...further];
  if (counted.length === 0) return err('not-measured');
  const convert = converterTo(limit, report);
  const lidIn = (list: readonly Reading[], vessel: Reading) => (lids === 'added' ? findLid(list, vessel) : undefined);
  const firstSpans = allOrNull(first.map((reading) => figureOf(reading, lidIn(report.readings, reading), convert)));
  const furtherSpans = allOrNull(further.map((reading) => figureOf(reading, lidIn(report.furtherPieces, reading), convert)));
  return firstSpans === null || furtherSpans === null ? err('needs-conversion') : ok({ first: firstSpans, further: furtherSpans });
}

/** Whether a vessel was read whose lid was not. */
export function isLidUnread(limit: LimitOf, report: Report): boolean {
  const { first, further } = readingsFor(limit, report);
  const hasLidIn = (list: readonly Reading[]) => (vessel: Reading) => findLid(list, vessel) !== undefined;
  return !first.every(hasLidIn(report.readings)) || !further.every(hasLidIn(report.furtherPieces));
}

function readingsFor(limit: LimitOf, { readings, furtherPieces }: Report): { readonly [key in keyof Figures]: readonly Reading[] } {
  const isMeant = ({ substance, part }: Reading): boolean => substance === limit.substance && part === limitedPart(limit);
  return { first: readings.filter(isMeant), further: furtherPieces.filter(isMeant) };
}

/** The lid of a vessel: the reading of the same specimen and substance in the same list. */
export const findLid = (list: readonly Reading[], { specimen, substance }: Reading): Reading | undefined =>
  list.find((one) => one.part === 'lid' && one.specimen === specimen && one.substance === substance);

type Converter = (reading: Reading) => Span | null;

function converterTo(limit: LimitOf, { extracts }: Report): Converter {
  const to = basisOf(limit);
  const unit = factorOf(limit.amount.unit, limit.per);
  return ({ value, below, unit: own, part }) => {
    const per = perOf(own, part);
    if (to === null || unit === null || per === null) return null;
    const factor = factorOf(own, per);
    const scale = scaleBetween({ per, part }, to, extracts);
    const into = factor === null || scale === null ? null : ratio(product(factor, scale), unit);
    return into === null ? null : scaled(spanOf({ value, below }), into);
  };
}

/** The extract that a limit is per: its own part's, but a rim limit per litre speaks of the litre that the vessel holds. */
function basisOf(limit: LimitOf): Basis | null {
  const part = limitedPart(limit);
  if (part === 'metal-part' || limit.part === 'glaze') return null;
  return { per: limit.per, part: part === 'rim' && limit.per === 'L' ? 'vessel' : part };
}

function figureOf(reading: Reading, lid: Reading | undefined, convert: Converter): Span | null {
  const own = convert(reading);
  if (own === null || lid === undefined) return own;
  const more = convert(lid);
  return more === null ? null : added(own, more);
}

function allOrNull(spans: readonly (Span | null)[]): readonly Span[] | null {
  const known = spans.flatMap((span) => (span === null ? [] : [span]));
  return known.length === spans.length ? known : null;
}

/** A limit's figure in milligrams per what it is per, to find the strictest. Null for a unit that does not fit. */
export function sizeOfLimit({ amount, per }: LimitOf, value: Fraction): Fraction | null {
  const factor = factorOf(amount.unit, per);
  return factor === null ? null : product(value, factor);
}
