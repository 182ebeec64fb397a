import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { NoRegion } from '@/components/regions/no-region';
import { RegionList } from '@/components/regions/region-list';
import { RegionSearch } from '@/components/site/region-search';
import { PageHeading } from '@/components/ui/page-heading';
import { MESSAGES, words } from '@/lib/kernel/words';
import { nearestRegions, searchRegions } from '@/lib/regions/domain/region-search';
import { listRegions } from '@/lib/regions/list-regions';
import { makeCtx } from '@/lib/server/ctx';

export const metadata: Metadata = { title: words('regions.list.title'), description: words('regions.list.description') };

const LONGEST = 80;
type Props = { readonly searchParams: Promise<Record<string, string | string[] | undefined>> };

export default async function RegionsPage({ searchParams }: Props): Promise<ReactElement> {
  const { q } = await searchParams;
  const asked = (typeof q === 'string' ? q : '').trim().slice(0, LONGEST);
  const regions = await listRegions(makeCtx());
  const others = MESSAGES.regions.alsoCalled;
  const found = searchRegions(regions, asked, others);
  const count = found.length;
  return (
    <>
      <PageHeading>{words('regions.list.title')}</PageHeading>
      <p className="mt-4 max-w-text">{words('regions.list.lead')}</p>
      <div className="mt-6">
        <RegionSearch asked={asked} />
      </div>
      <p role="status" className="mt-4 font-sans text-plain">
        {asked === '' ? words('regions.list.all', { count }) : words('regions.list.found', { count, asked })}
      </p>
      {asked === '' || count === 0 ? null : (
        <p>
          <a href="/regions">{words('regions.list.showAll')}</a>
        </p>
      )}
      {count === 0 ? (
        <NoRegion asked={asked} nearest={nearestRegions(regions, asked, others)} />
      ) : (
        <RegionList regions={found} names={new Map(regions.map(({ code, name }) => [code, name]))} />
      )}
    </>
  );
}
