import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { ReadingsForm } from '@/components/readings/readings-form';
import { PageHeading } from '@/components/ui/page-heading';
import { words } from '@/lib/kernel/words';
import { readSheetEntry } from '@/lib/readings/domain/sheet-entry';
import { START_FIELDS } from '@/lib/readings/domain/start-fields';
import { listRegions } from '@/lib/regions/list-regions';
import { makeCtx } from '@/lib/server/ctx';
import { newAddress } from '@/lib/server/new-address';
import { keepReadings } from './actions';

type Props = { readonly searchParams: Promise<{ readonly region?: string | string[] }> };

export const metadata: Metadata = { title: words('readings-page.title'), description: words('readings-page.description') };

export default async function ReadingsPage({ searchParams }: Props): Promise<ReactElement> {
  const { region } = await searchParams;
  const places = await listRegions(makeCtx());
  const fields = { ...START_FIELDS, ...(region === undefined ? {} : { region: [region].flat() }) };
  return (
    <>
      <PageHeading>{words('readings-page.title')}</PageHeading>
      <p className="mt-4 max-w-text">{words('readings-page.lead')}</p>
      <p className="mt-2 max-w-text">{words('readings-page.covers')}</p>
      <p className="mt-2 max-w-text">
        {words.rich('readings-page.substances', {
          lead: (said) => <a href="/substances/pb">{said}</a>,
          cadmium: (said) => <a href="/substances/cd">{said}</a>,
        })}
      </p>
      <div className="mt-8">
        <ReadingsForm
          address={newAddress()}
          view={{ fields, entry: readSheetEntry(fields), faults: [] }}
          places={places}
          submit={words('readings-page.act.judge')}
          act={keepReadings}
        />
      </div>
    </>
  );
}
