import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { one, type Query } from '@/app/(account)/form-words';
import { DraftFrame } from '@/components/amend/draft-frame';
import { NewPart } from '@/components/amend/new-part';
import { words } from '@/lib/kernel/words';
import { ITEM_LISTS } from '@/lib/regions/domain/sheet-items';
import { readFormGround } from '@/lib/regions/read-form-ground';
import { add } from '../../../actions';
import { findDraft } from '../../../find-draft';
import { freshKey } from '../../../fresh-key';
import { draftPage } from '../../../item-address';

type Params = Promise<{ readonly id: string; readonly list: string }>;
type Props = { readonly params: Params; readonly searchParams: Promise<Query> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { list } = await params;
  const found = ITEM_LISTS.find((one) => one === list);
  return { title: found === undefined ? words('amend.own.title') : words(`amend.new.title.${found}`), robots: { index: false } };
}

export default async function NewPartPage({ params, searchParams }: Props): Promise<ReactElement> {
  const { id, list } = await params;
  const found = ITEM_LISTS.find((one) => one === list);
  if (found === undefined) notFound();
  const { ctx, draft } = await findDraft(id);
  const query = await searchParams;
  const { places } = await readFormGround(ctx, draft.document);
  return (
    <DraftFrame title={words(`amend.new.title.${found}`)} name={draft.name} back={draftPage(id)} takesFocus={false}>
      <NewPart
        action={add}
        hidden={{ key: freshKey(), id, list: found }}
        list={found}
        topic={one(query, 'topic') ?? ''}
        places={places.filter(({ hasSheet, code }) => hasSheet && code !== draft.document.code)}
        isNameless={one(query, 'why') === 'name'}
      />
    </DraftFrame>
  );
}
