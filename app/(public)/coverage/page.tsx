import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { CoverageLegend, CoverageMap } from '@/components/library/coverage-map';
import { CoverageTable } from '@/components/library/coverage-table';
import { PageHeading } from '@/components/ui/page-heading';
import { words } from '@/lib/kernel/words';
import { listCoverage } from '@/lib/regions/list-coverage';
import { makeCtx } from '@/lib/server/ctx';
import { MAP_SIZE } from '@/lib/server/world-map';

export const metadata: Metadata = { title: words('coverage.title'), description: words('coverage.description') };

export default async function CoveragePage(): Promise<ReactElement> {
  const { countries, shapes } = await listCoverage(makeCtx());
  return (
    <>
      <PageHeading>{words('coverage.title')}</PageHeading>
      <p className="mt-4 max-w-text">{words('coverage.lead')}</p>
      <p className="mt-2">
        <a href="/regions">{words('coverage.find')}</a>
      </p>
      <p>
        <a href="/regions/new">{words('amend.newPlace.link')}</a>
      </p>
      <CoverageMap countries={countries} shapes={shapes} size={MAP_SIZE} />
      <p className="mt-2 max-w-text text-small text-umber">{words('coverage.licence')}</p>
      <CoverageLegend countries={countries} />
      <CoverageTable countries={countries} />
    </>
  );
}
