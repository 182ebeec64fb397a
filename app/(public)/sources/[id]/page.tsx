import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { cache, type ReactElement } from 'react';
import { SourcePage } from '@/components/library/source-page';
import { words } from '@/lib/kernel/words';
import type { CitedText } from '@/lib/regions/domain/cited-text';
import { readSource } from '@/lib/regions/read-source';
import { makeCtx } from '@/lib/server/ctx';

type Props = { readonly params: Promise<{ readonly id: string }> };

/** Read once a request. */
const findSource = cache(async (address: string): Promise<CitedText | null> => {
  const found = await readSource(makeCtx(), address);
  return found.ok ? found.value : null;
});

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const text = await findSource((await params).id);
  if (text === null) return {};
  const { title } = text.source;
  return { title: words('library.sources.titleOf', { title }), description: words('library.sources.descriptionOf', { title }) };
}

export default async function OneSourcePage({ params }: Props): Promise<ReactElement> {
  const text = await findSource((await params).id);
  if (text === null) notFound();
  return <SourcePage text={text} />;
}
