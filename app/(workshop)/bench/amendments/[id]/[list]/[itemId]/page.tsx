import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import type { Query } from '@/app/(account)/form-words';
import { words } from '@/lib/kernel/words';
import { isItemKey } from '@/lib/regions/domain/sheet-items';
import { ItemPage } from '../../item-page';

type Params = Promise<{ readonly id: string; readonly list: string; readonly itemId: string }>;
type Props = { readonly params: Params; readonly searchParams: Promise<Query> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { itemId } = await params;
  return { title: words('amend.form.title', { item: itemId }), robots: { index: false } };
}

export default async function OneItemPage({ params, searchParams }: Props): Promise<ReactElement> {
  const { id, list, itemId } = await params;
  const item = `${list}/${itemId}`;
  if (!isItemKey(item)) notFound();
  return <ItemPage id={id} item={item} query={await searchParams} />;
}
