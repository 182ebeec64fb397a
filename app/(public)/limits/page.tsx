import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { Caution } from '@/components/checks/caution';
import { LimitComparisonTable, wareWords } from '@/components/library/limit-comparison';
import { LimitForm } from '@/components/library/limit-form';
import { PageHeading } from '@/components/ui/page-heading';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { words } from '@/lib/kernel/words';
import { SUBSTANCES } from '@/lib/readings/domain/row-words';
import { compareLimits, MOST_PLACES } from '@/lib/regions/compare-limits';
import { saySubstance } from '@/lib/regions/domain/figure-words';
import { rowsNamed, type LimitComparison } from '@/lib/regions/domain/limit-comparison';
import { earliestSeen } from '@/lib/regions/domain/sheet-reading';
import { makeCtx } from '@/lib/server/ctx';

export const metadata: Metadata = { title: words('library.limits.title'), description: words('library.limits.description') };

type Given = string | string[] | undefined;
type Props = { readonly searchParams: Promise<Record<string, Given>> };

const LONGEST = 80;
const MOST_ASKED = 100;
const listOf = (given: Given): readonly string[] => (given === undefined ? [] : [given].flat().slice(0, MOST_ASKED));
const textOf = (given: Given): string => (listOf(given)[0] ?? '').trim().slice(0, LONGEST);

export default async function LimitsPage({ searchParams }: Props): Promise<ReactElement> {
  const given = await searchParams;
  const regions = listOf(given['region']);
  const symbol = SUBSTANCES.find((one) => one.toLowerCase() === textOf(given['substance']).toLowerCase()) ?? 'Pb';
  const ware = textOf(given['ware']);
  const ctx = makeCtx();
  const { comparable, comparison, tooMany } = await compareLimits(ctx, { regions, symbol });
  return (
    <>
      <PageHeading>{words('library.limits.title')}</PageHeading>
      <p className="mt-4 max-w-text">{words('library.limits.lead')}</p>
      {comparison === null ? (
        <p role="status" className="mt-4">
          {words('library.limits.nothing')}
        </p>
      ) : (
        <Compared comparison={comparison} symbol={symbol} ware={ware} today={calendarDateOf(ctx.now)} tooMany={tooMany} />
      )}
      <LimitForm places={comparable} chosen={regions} substances={SUBSTANCES} symbol={symbol} ware={ware} />
    </>
  );
}

type ComparedProps = {
  readonly comparison: LimitComparison;
  readonly symbol: string;
  readonly ware: string;
  readonly today: ReturnType<typeof calendarDateOf>;
  readonly tooMany: number;
};

function Compared({ comparison, symbol, ware, today, tooMany }: ComparedProps): ReactElement {
  const rows = rowsNamed(comparison.rows, ware, wareWords);
  const name = saySubstance(symbol);
  const known = new Set(comparison.rows.flatMap(({ cells }) => Object.keys(cells)));
  const rules = rows.flatMap(({ cells }) => Object.values(cells).flatMap((cell) => cell.map(({ row }) => row.rule)));
  return (
    <>
      <p role="status" className="mt-4 font-sans text-plain">
        {words('library.limits.count', { rows: rows.length, places: comparison.places.length, name })}
        {tooMany === 0 ? null : ` ${words('library.limits.tooMany', { most: MOST_PLACES, count: tooMany })}`}
      </p>
      <div className="mt-4 max-w-text">
        <Caution seenOn={earliestSeen(rules) ?? today} />
      </div>
      {rows.length === 0 ? null : (
        <div className="mt-6">
          <LimitComparisonTable places={comparison.places} rows={rows} known={known} name={name} />
        </div>
      )}
      <ul className="mt-4 ms-6 max-w-text list-disc text-umber">
        <li>{words('library.limits.borders')}</li>
        <li>{words('library.limits.units')}</li>
        <li>{words('library.limits.apart')}</li>
        <li>{words('library.limits.empty')}</li>
      </ul>
      <p className="not-in-print mt-4">
        <a href={`/substances/${symbol.toLowerCase()}`}>{words('library.limits.everywhere', { name })}</a>
      </p>
      <h2 className="not-in-print mt-12">{words('library.limits.form.title')}</h2>
    </>
  );
}
