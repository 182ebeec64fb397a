import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { one, type Query } from '@/app/(account)/form-words';
import { DeskFrame } from '@/components/stewards/desk-frame';
import { RequestTable } from '@/components/stewards/request-table';
import { listRequests } from '@/lib/accounts/list-requests';
import { words } from '@/lib/kernel/words';
import { placeWords } from '@/lib/regions/domain/condition-words';
import { enter } from '@/lib/server/lead-on';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('stewards.requests.title'), robots: { index: false } };

export default async function RequestsPage({ searchParams }: Props): Promise<ReactElement> {
  const { ctx } = await enter('role.read-requests', '/stewards/requests');
  const found = await listRequests(ctx);
  if (!found.ok) notFound();
  const requests = found.value.map(({ id, name, madeAt, regions }) => ({ id, name, madeAt, places: regions.map(placeWords) }));
  const isDone = one(await searchParams, 'done') === 'answered';
  return (
    <DeskFrame
      title={words('stewards.requests.title')}
      path="/stewards/requests"
      done={isDone ? words('stewards.done.answered') : undefined}
    >
      <p className="mt-4 max-w-text">{words('stewards.requests.lead')}</p>
      <div className="mt-6">
        <RequestTable requests={requests} />
      </div>
    </DeskFrame>
  );
}
