import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { EditionsTable } from '@/components/regions/editions-table';
import { PageHeading } from '@/components/ui/page-heading';
import { words } from '@/lib/kernel/words';
import { listEditions } from '@/lib/regions/list-editions';
import { makeCtx } from '@/lib/server/ctx';
import { findSheet } from '../find-sheet';

type Props = { readonly params: Promise<{ readonly code: string }> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const sheet = await findSheet((await params).code);
  if (sheet === null) return {};
  const { name } = sheet;
  return { title: words('regions.editions.title', { name }), description: words('regions.editions.description', { name }) };
}

export default async function EditionsPage({ params }: Props): Promise<ReactElement> {
  const sheet = await findSheet((await params).code);
  if (sheet === null) notFound();
  const editions = await listEditions(makeCtx(), sheet.code);
  if (!editions.ok) notFound();
  return (
    <>
      <PageHeading>{words('regions.editions.title', { name: sheet.name })}</PageHeading>
      <p className="mt-4 max-w-text">{words('regions.editions.lead')}</p>
      <div className="mt-6">
        <EditionsTable sheet={sheet} editions={editions.value} />
      </div>
      <p className="mt-6">
        <a href={`/regions/${sheet.code}/editions/compare`}>{words('editions.chooseLink')}</a>
      </p>
      <p className="mt-3">
        <a href={`/regions/${sheet.code}`}>{words('regions.editions.back', { name: sheet.name })}</a>
      </p>
    </>
  );
}
