import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { one, type Query } from '@/app/(account)/form-words';
import { Note } from '@/components/accounts/note';
import { EditionsTable } from '@/components/regions/editions-table';
import { PageHeading } from '@/components/ui/page-heading';
import type { Actor } from '@/lib/access/domain/actor';
import { can } from '@/lib/access/domain/policy';
import { words } from '@/lib/kernel/words';
import { listEditions } from '@/lib/regions/list-editions';
import { makeCtx } from '@/lib/server/ctx';
import { currentActor } from '@/lib/server/session';
import { findSheet } from '../find-sheet';

type Props = { readonly params: Promise<{ readonly code: string }>; readonly searchParams: Promise<Query> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const sheet = await findSheet((await params).code);
  if (sheet === null) return {};
  const { name } = sheet;
  return { title: words('regions.editions.title', { name }), description: words('regions.editions.description', { name }) };
}

export default async function EditionsPage({ params, searchParams }: Props): Promise<ReactElement> {
  const sheet = await findSheet((await params).code);
  if (sheet === null) notFound();
  const editions = await listEditions(makeCtx(), sheet.code);
  if (!editions.ok) notFound();
  const last = editions.value.at(-1)?.number ?? 1;
  const isDone = one(await searchParams, 'done') === String(last) && last > 1;
  return (
    <>
      {isDone ? <Note>{words('review.withdraw.done', { number: last })}</Note> : null}
      <PageHeading>{words('regions.editions.title', { name: sheet.name })}</PageHeading>
      <p className="mt-4 max-w-text">{words('regions.editions.lead')}</p>
      <div className="mt-6">
        <EditionsTable sheet={sheet} editions={editions.value} />
      </div>
      <p className="mt-6">
        <a href={`/regions/${sheet.code}/editions/compare`}>{words('editions.chooseLink')}</a>
      </p>
      <WithdrawLink code={sheet.code} last={last} actor={await currentActor()} />
      <p className="mt-3">
        <a href={`/regions/${sheet.code}`}>{words('regions.editions.back', { name: sheet.name })}</a>
      </p>
    </>
  );
}

type LinkProps = { readonly code: string; readonly last: number; readonly actor: Actor };

/** For moderators; the first edition has none before it that could come back. */
function WithdrawLink({ code, last, actor }: LinkProps): ReactElement | null {
  if (last === 1 || !can(actor, 'edition.withdraw')) return null;
  return (
    <p className="mt-3">
      <a href={`/regions/${code}/editions/withdraw`}>{words('review.withdraw.link', { number: last })}</a>
    </p>
  );
}
