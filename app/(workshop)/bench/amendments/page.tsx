import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import type { ReactElement } from 'react';
import { one, type Query } from '@/app/(account)/form-words';
import { AccountFrame } from '@/components/accounts/account-frame';
import { OwnList } from '@/components/amend/own-list';
import { Panel } from '@/components/ui/panel';
import { words } from '@/lib/kernel/words';
import { listOwnAmendments } from '@/lib/regions/list-own-amendments';
import { doorOf, enter } from '@/lib/server/lead-on';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('amend.own.title'), robots: { index: false } };

export default async function OwnAmendmentsPage({ searchParams }: Props): Promise<ReactElement> {
  const { ctx } = await enter('amendment.write', '/bench/amendments');
  const own = await listOwnAmendments(ctx);
  if (!own.ok) redirect(doorOf(own.error.kind, '/bench/amendments') ?? '/bench');
  return (
    <AccountFrame title={words('amend.own.title')} back={{ href: '/bench', text: words('amend.own.back') }}>
      {one(await searchParams, 'why') === 'form' ? (
        <div className="mt-4">
          <Panel colour="copper">
            <p>{words('amend.refused.form')}</p>
          </Panel>
        </div>
      ) : null}
      <p className="mt-4">{words('amend.own.lead')}</p>
      <OwnList rows={own.value} />
      {own.value.length === 0 ? null : (
        <p className="mt-8">
          <a href="/regions">{words('amend.own.choose')}</a>
        </p>
      )}
    </AccountFrame>
  );
}
