import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import type { Query } from '@/app/(account)/form-words';
import { words } from '@/lib/kernel/words';
import { WHOLE_ITEMS } from '@/lib/regions/domain/sheet-items';
import { ItemPage } from '../item-page';

type Props = { readonly params: Promise<{ readonly id: string; readonly list: string }>; readonly searchParams: Promise<Query> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { list } = await params;
  const item = WHOLE_ITEMS.find((one) => one === list);
  return { title: item === undefined ? words('amend.own.title') : words(`amend.list.one.${item}`), robots: { index: false } };
}

export default async function WholeItemPage({ params, searchParams }: Props): Promise<ReactElement> {
  const { id, list } = await params;
  const item = WHOLE_ITEMS.find((one) => one === list);
  if (item === undefined) notFound();
  return <ItemPage id={id} item={item} query={await searchParams} />;
}
