import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { PlacesForm } from '@/components/checks/places-form';
import { words } from '@/lib/kernel/words';
import { listRegions } from '@/lib/regions/list-regions';
import { makeCtx } from '@/lib/server/ctx';
import { newAddress } from '@/lib/server/new-address';
import { noteAnswer } from '@/lib/checks/schema';
import { begin } from './actions';
import { placesAsked, type PlacesQuery } from './places-query';

type Props = { readonly searchParams: Promise<PlacesQuery> };

export const metadata: Metadata = { title: words('checks.title'), description: words('checks.lead') };

export default async function CheckPage({ searchParams }: Props): Promise<ReactElement> {
  const asked = placesAsked(await searchParams);
  const places = await listRegions(makeCtx());
  return (
    <div className="max-w-text">
      <p className="mb-2 font-sans text-plain text-umber">{words('checks.title')}</p>
      <PlacesForm
        address={newAddress()}
        places={places}
        chosen={asked.chosen}
        saleOn={asked.on}
        why={asked.why}
        fromNote={noteAnswer.parse(asked.fromNote)}
        submit={words('checks.places.begin')}
        act={begin}
      />
      <p className="mt-6">{words('checks.lead')}</p>
    </div>
  );
}
