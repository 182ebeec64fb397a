import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { ChangeList } from '@/components/library/change-list';
import { PlaceFilter } from '@/components/library/place-filter';
import { PageHeading } from '@/components/ui/page-heading';
import { words } from '@/lib/kernel/words';
import { listChanges, type ListedChanges } from '@/lib/regions/list-changes';
import { makeCtx } from '@/lib/server/ctx';

export const metadata: Metadata = { title: words('library.changes.title'), description: words('library.changes.description') };

type Props = { readonly searchParams: Promise<Record<string, string | string[] | undefined>> };

export default async function ChangesPage({ searchParams }: Props): Promise<ReactElement> {
  const { region } = await searchParams;
  const changes = await listChanges(makeCtx(), { region: typeof region === 'string' && region !== '' ? region : null });
  const { coming, past, places, narrowed } = changes;
  return (
    <>
      <PageHeading>{words('library.changes.title')}</PageHeading>
      <p className="mt-4 max-w-text">{words('library.changes.lead')}</p>
      <PlaceFilter action="/changes" places={places} chosen={narrowed?.code} />
      <p role="status" className="mt-4 font-sans text-plain">
        {words('library.changes.count', { count: countOf(changes), place: narrowed === null ? 'none' : 'one', name: narrowed?.name ?? '' })}
      </p>
      {narrowed === null ? null : (
        <p>
          <a href="/changes">{words('library.filter.showAll')}</a>
        </p>
      )}
      <ChangeList id="coming" months={coming} />
      <ChangeList id="past" months={past} />
      <p className="mt-12 max-w-text text-umber">{words('library.changes.note')}</p>
    </>
  );
}

const countOf = ({ coming, past }: ListedChanges): number => [...coming, ...past].reduce((sum, { changes }) => sum + changes.length, 0);
