import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { LibraryLinks } from '@/components/library/library-links';
import { WishedPlaces } from '@/components/library/wish-form';
import { NoRegion } from '@/components/regions/no-region';
import { RegionList } from '@/components/regions/region-list';
import { RegionSearch } from '@/components/site/region-search';
import { PageHeading } from '@/components/ui/page-heading';
import { words } from '@/lib/kernel/words';
import { findRegions, type FoundRegions } from '@/lib/regions/find-regions';
import { listWishes } from '@/lib/regions/list-wishes';
import { makeCtx } from '@/lib/server/ctx';
import { wish } from './wishes/actions';

export const metadata: Metadata = { title: words('regions.list.title'), description: words('regions.list.description') };

const LONGEST = 80;
type Props = { readonly searchParams: Promise<Record<string, string | string[] | undefined>> };

export default async function RegionsPage({ searchParams }: Props): Promise<ReactElement> {
  const { q } = await searchParams;
  const asked = (typeof q === 'string' ? q : '').trim().slice(0, LONGEST);
  const ctx = makeCtx();
  const regions = await findRegions(ctx, asked);
  const count = regions.found.length;
  return (
    <>
      <PageHeading>{words('regions.list.title')}</PageHeading>
      <p className="mt-4 max-w-text">{words('regions.list.lead')}</p>
      <div className="mt-6">
        <RegionSearch asked={asked} />
      </div>
      <p role="status" className="mt-4 font-sans text-plain">
        {statusOf(regions, asked)}
      </p>
      {asked === '' || count === 0 ? null : (
        <p>
          <a href="/regions">{words('regions.list.showAll')}</a>
        </p>
      )}
      <Found regions={regions} asked={asked} />
      {regions.without.length === 0 ? null : <Without regions={regions} ctx={ctx} />}
      <LibraryLinks />
    </>
  );
}

function Found({
  regions: { all, found, nearest, without },
  asked,
}: {
  readonly regions: FoundRegions;
  readonly asked: string;
}): ReactElement | null {
  if (found.length > 0) return <RegionList regions={found} names={new Map(all.map(({ code, name }) => [code, name]))} />;
  return without.length > 0 ? null : <NoRegion asked={asked} nearest={nearest} />;
}

function statusOf({ found, without }: FoundRegions, asked: string): string {
  const count = found.length;
  if (asked === '') return words('regions.list.all', { count });
  return count === 0 && without.length > 0 ? words('library.wish.status', { asked }) : words('regions.list.found', { count, asked });
}

type WithoutProps = { readonly regions: FoundRegions; readonly ctx: Parameters<typeof listWishes>[0] };

async function Without({ regions: { without }, ctx }: WithoutProps): Promise<ReactElement> {
  const wishes = new Map((await listWishes(ctx)).map((one) => [one.code, one]));
  return <WishedPlaces places={without.map((country) => ({ count: 0, ...wishes.get(country.code), ...country }))} act={wish} />;
}
