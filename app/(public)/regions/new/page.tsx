import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { beginNewPlace } from '@/app/(workshop)/bench/amendments/actions';
import { AskToEdit } from '@/components/amend/ask-to-edit';
import { EntryForm } from '@/components/accounts/entry-form';
import { PageHeading } from '@/components/ui/page-heading';
import { can } from '@/lib/access/domain/policy';
import { words } from '@/lib/kernel/words';
import { listRegions } from '@/lib/regions/list-regions';
import { makeActorCtx } from '@/lib/server/actor-ctx';
import { freshForm } from '@/lib/server/define-action';
import { findKept } from '@/lib/server/kept-form';
import { enter } from '@/lib/server/lead-on';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('amend.newPlace.title'), robots: { index: false } };

const KINDS = ['country', 'part', 'bloc', 'standard'] as const;

export default async function NewPlacePage({ searchParams }: Props): Promise<ReactElement> {
  const ctx = await makeActorCtx();
  if (ctx.actor.kind === 'account' && !can(ctx.actor, 'amendment.write'))
    return <AskToEdit heading={<PageHeading>{words('amend.newPlace.title')}</PageHeading>} />;
  await enter('amendment.write', '/regions/new');
  const query = await searchParams;
  const first = (await findKept(one(query, 'look'))) ?? freshForm({ region: one(query, 'code') ?? '', name: one(query, 'name') ?? '' });
  const regions = await listRegions(ctx);
  return (
    <div className="max-w-text">
      <PageHeading>{words('amend.newPlace.title')}</PageHeading>
      <p className="mt-4 mb-6">{words('amend.newPlace.lead')}</p>
      <EntryForm
        action={beginNewPlace}
        first={first}
        {...formWords()}
        submit={words('amend.newPlace.button')}
        fields={[
          { name: 'region', type: 'text', label: words('amend.newPlace.region'), hint: words('amend.newPlace.regionHint') },
          { name: 'name', type: 'text', label: words('amend.place.name') },
          {
            name: 'kind',
            type: 'choice',
            label: words('amend.place.kind'),
            none: words('amend.form.choose'),
            options: KINDS.map((value) => ({ value, label: words(`editions.regionKind.${value}`) })),
          },
          { name: 'languages', type: 'text', label: words('amend.place.languages'), hint: words('amend.place.languagesHint') },
          {
            name: 'parent',
            type: 'choice',
            label: words('amend.newPlace.parent'),
            hint: words('amend.newPlace.parentHint'),
            none: words('amend.newPlace.noParent'),
            options: regions.map(({ code, name }) => ({ value: code, label: name })),
          },
          { name: 'text', type: 'long-text', label: words('amend.text.label'), hint: words('amend.text.hint') },
        ]}
      />
    </div>
  );
}
