import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement, ReactNode } from 'react';
import { one, type Query } from '@/app/(account)/form-words';
import { LiveSortingTable } from '@/components/review/live-table';
import { ReviewFrame } from '@/components/review/review-frame';
import { TableEmpty } from '@/components/review/table-empty';
import { WaitingFilter } from '@/components/review/waiting-filter';
import { tableColumns, tableWords } from '@/components/review/table-words';
import { words } from '@/lib/kernel/words';
import { waitingQuery, type WaitingQuery } from '@/lib/regions/amendment-schema';
import { placeWords } from '@/lib/regions/domain/condition-words';
import { listRegions, type ListedRegion } from '@/lib/regions/list-regions';
import { regionCode } from '@/lib/regions/schema';
import { enter } from '@/lib/server/lead-on';
import { showTable } from './show-table';
import { isNarrowed, tableQuery } from './table-address';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('review.title'), robots: { index: false } };

export default async function SortingTablePage({ searchParams }: Props): Promise<ReactElement> {
  const asked = await searchParams;
  const query = waitingQuery.parse(asked);
  const { ctx } = await enter('amendment.judge', '/sorting-table');
  const table = await showTable(ctx, query);
  if (!table.ok) notFound();
  const regions = await listRegions(ctx);
  const { region, state, days, sort } = query;
  const narrowed = isNarrowed(query);
  return (
    <ReviewFrame title={words('review.title')} done={doneWords(asked, regions)}>
      <p className="mt-4 max-w-text">{words('review.lead')}</p>
      <div className="mt-6">
        <WaitingFilter places={placesOf(regions, query)} region={region} state={state} days={days} sort={sort} />
        {narrowed ? (
          <p className="mt-3">
            <a href="/sorting-table">{words('review.filter.clear')}</a>
          </p>
        ) : null}
      </div>
      <div className="mt-8">
        <LiveSortingTable
          key={tableQuery(query)}
          first={table.value}
          address={`/api/sorting-table?${tableQuery(query)}`}
          columns={tableColumns(sort ?? 'waiting', (by) => `/sorting-table?${tableQuery(query, { sort: by })}`)}
          said={tableWords()}
        >
          <TableEmpty isNarrowed={narrowed} />
        </LiveSortingTable>
      </div>
    </ReviewFrame>
  );
}

/** Places with a sheet by name; one that is asked for and has none stands among them, so that it is seen what is asked. */
function placesOf(regions: readonly ListedRegion[], { region }: WaitingQuery): readonly { readonly code: string; readonly name: string }[] {
  const places = regions.map(({ code, name }) => ({ code, name }));
  const all = region === undefined || places.some(({ code }) => code === region) ? places : [...places, nameless(region)];
  return all.toSorted((a, b) => a.name.localeCompare(b.name, 'en'));
}

const nameless = (code: string): { readonly code: string; readonly name: string } => ({ code, name: placeWords(code) });

const DONE = ['once-approved', 'sent-back', 'held', 'released', 'refused-stale'] as const;

/** What was just decided, with the way to what came of it. */
function doneWords(query: Query, regions: readonly ListedRegion[]): ReactNode {
  const done = one(query, 'done');
  if (done === 'in-use') return <InUse query={query} regions={regions} />;
  const known = DONE.find((kind) => kind === done);
  if (known === undefined) return null;
  const of = one(query, 'of');
  return (
    <>
      {words(`review.done.${known}`)}{' '}
      {of === undefined ? null : <a href={`/sorting-table/${encodeURIComponent(of)}`}>{words('review.done.read')}</a>}
    </>
  );
}

function InUse({ query, regions }: { readonly query: Query; readonly regions: readonly ListedRegion[] }): ReactElement | null {
  const place = regionCode.safeParse(one(query, 'place'));
  const edition = Number(one(query, 'edition'));
  if (!place.success || !Number.isSafeInteger(edition)) return null;
  const name = regions.find(({ code }) => code === place.data)?.name ?? placeWords(place.data);
  return (
    <>
      {words('review.done.in-use', { edition, place: name })} <a href={`/regions/${place.data}`}>{words('review.done.in-use-link')}</a>
    </>
  );
}
