import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { ChainPanel } from '@/components/day-book/chain-panel';
import { LineFilter } from '@/components/day-book/line-filter';
import { LineTable } from '@/components/day-book/line-table';
import { ErrorSummary } from '@/components/ui/error-summary';
import { PageHeading } from '@/components/ui/page-heading';
import { readChainState } from '@/lib/day-book/read-chain-state';
import { readDayBook } from '@/lib/day-book/read-day-book';
import { dayBookQuery, type DayBookQuery } from '@/lib/day-book/schema';
import { words } from '@/lib/kernel/words';
import { makeCtx } from '@/lib/server/ctx';

type Query = Readonly<Record<string, string | string[] | undefined>>;
type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('day-book.title'), description: words('day-book.description') };

const typedIn = (query: Query, name: 'from' | 'until'): string => ([query[name]].flat()[0] ?? '').trim().slice(0, 40);

export default async function DayBookPage({ searchParams }: Props): Promise<ReactElement> {
  const query = await searchParams;
  const asked = dayBookQuery.parse(query);
  const typed = { from: typedIn(query, 'from'), until: typedIn(query, 'until') };
  const wrong = (['from', 'until'] as const).filter((name) => typed[name] !== '' && asked[name] === undefined);
  const ctx = makeCtx();
  const [{ lines, next, places }, chain] = await Promise.all([readDayBook(ctx, asked), readChainState(ctx)]);
  const isFiltered = Object.values(asked).some((value) => value !== undefined);
  return (
    <>
      {wrong.length === 0 ? null : (
        <ErrorSummary
          heading={words('day-book.filter.heading', { count: wrong.length })}
          faults={wrong.map((id) => ({ id, said: words('day-book.filter.dateWrong') }))}
          tries={1}
        />
      )}
      <PageHeading>{words('day-book.title')}</PageHeading>
      <p className="mt-4 max-w-text">{words('day-book.lead')}</p>
      <div className="mt-6">
        <LineFilter kind={asked.kind} region={asked.region} places={places} {...typed} wrong={wrong} />
      </div>
      {isFiltered ? (
        <p className="mt-4">
          <a href="/day-book">{words('day-book.filter.all')}</a>
        </p>
      ) : null}
      <div className="mt-8">
        {lines.length === 0 ? (
          <p>{isFiltered ? words('day-book.none') : words('day-book.nothingYet')}</p>
        ) : (
          <LineTable lines={lines} places={places} />
        )}
      </div>
      {next === null ? null : (
        <p className="mt-6">
          <a href={olderOf(asked, next)}>{words('day-book.older')}</a>
        </p>
      )}
      <ChainPanel {...chain} />
    </>
  );
}

function olderOf({ kind, region, from, until }: DayBookQuery, before: number): string {
  const query = new URLSearchParams({
    ...(kind === undefined ? {} : { kind }),
    ...(region === undefined ? {} : { region }),
    ...(from === undefined ? {} : { from }),
    ...(until === undefined ? {} : { until }),
    before: String(before),
  });
  return `/day-book?${query.toString()}`;
}
