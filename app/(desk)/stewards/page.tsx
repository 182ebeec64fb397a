import type { Metadata } from 'next';
import { notFound, redirect } from 'next/navigation';
import type { ReactElement } from 'react';
import type { Query } from '@/app/(account)/form-words';
import { AccountSearch } from '@/components/stewards/account-search';
import { AccountTable } from '@/components/stewards/account-table';
import { DeskFrame } from '@/components/stewards/desk-frame';
import { listAccounts } from '@/lib/accounts/list-accounts';
import { accountSearch } from '@/lib/accounts/steward-schema';
import { words } from '@/lib/kernel/words';
import { enter } from '@/lib/server/lead-on';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('stewards.title'), robots: { index: false } };

export default async function AccountsPage({ searchParams }: Props): Promise<ReactElement> {
  const { ctx } = await enter('account.look-up', '/stewards');
  const { q, role, after } = accountSearch.parse(await searchParams);
  const found = await listAccounts(ctx, { q, role, after });
  if (!found.ok) notFound();
  const { accounts, next } = found.value;
  if (accounts.length === 0 && after !== undefined) redirect('/stewards');
  return (
    <DeskFrame title={words('stewards.accounts.title')} path="/stewards">
      <p className="mt-4 max-w-text">{words('stewards.lead')}</p>
      <div className="mt-6">
        <AccountSearch q={q ?? ''} role={role} />
      </div>
      <div className="mt-8">
        <AccountTable accounts={accounts} />
      </div>
      {next === null ? null : (
        <p className="mt-6">
          <a href={moreOf({ q, role }, next)}>{words('stewards.accounts.next')}</a>
        </p>
      )}
    </DeskFrame>
  );
}

function moreOf(asked: { readonly q: string | undefined; readonly role: string | undefined }, after: string): string {
  const kept = Object.entries(asked).flatMap(([name, value]) => (value === undefined ? [] : [[name, value]]));
  return `/stewards?${new URLSearchParams([...kept, ['after', after]]).toString()}`;
}
