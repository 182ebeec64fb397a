import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { PlacesForm } from '@/components/checks/places-form';
import { readCheck } from '@/lib/checks/read-check';
import { checkId } from '@/lib/checks/schema';
import { words } from '@/lib/kernel/words';
import { listRegions } from '@/lib/regions/list-regions';
import { makeCtx } from '@/lib/server/ctx';
import { place } from '../../actions';
import { placesAsked, type PlacesQuery } from '../../places-query';

type Props = { readonly params: Promise<{ readonly checkId: string }>; readonly searchParams: Promise<PlacesQuery> };

export const metadata: Metadata = { title: `${words('checks.places.title')} – ${words('checks.title')}`, robots: { index: false } };

export default async function PlacesPage({ params, searchParams }: Props): Promise<ReactElement> {
  const id = checkId.safeParse((await params).checkId);
  const ctx = makeCtx();
  const read = id.success ? await readCheck(ctx, id.data) : null;
  if (read?.ok !== true) notFound();
  const { check } = read.value;
  const asked = placesAsked(await searchParams);
  const back = asked.why !== null;
  return (
    <div className="max-w-text">
      <PlacesForm
        address={check.id}
        places={await listRegions(ctx)}
        chosen={back ? asked.chosen : check.regions}
        saleOn={back ? asked.on : (check.saleOn ?? '')}
        why={asked.why}
        submit={words('checks.places.change')}
        act={place}
      />
    </div>
  );
}
