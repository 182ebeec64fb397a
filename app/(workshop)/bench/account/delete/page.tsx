import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { AccountFrame } from '@/components/accounts/account-frame';
import { Press } from '@/components/accounts/press';
import { words } from '@/lib/kernel/words';
import { freshForm } from '@/lib/server/define-action';
import { findKept } from '@/lib/server/kept-form';
import { enter } from '@/lib/server/lead-on';
import { leave } from '../actions';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('bench.delete.title'), robots: { index: false } };

export default async function DeletePage({ searchParams }: Props): Promise<ReactElement> {
  await enter('account.leave', '/bench/account/delete');
  return (
    <AccountFrame title={words('bench.delete.title')}>
      <p className="mt-4">{words('bench.delete.lead')}</p>
      <ul className="my-4 list-disc ps-6">
        {(['now', 'days', 'then', 'stays'] as const).map((part) => (
          <li key={part} className="py-1">
            {words(`bench.delete.${part}`)}
          </li>
        ))}
      </ul>
      <p className="mb-6">{words.rich('bench.delete.export', { link: (said) => <a href="/bench/account/export">{said}</a> })}</p>
      <Press
        action={leave}
        first={(await findKept(one(await searchParams, 'look'))) ?? freshForm()}
        busy={formWords().busy}
        kind="primary"
        submit={words('bench.delete.submit')}
      />
    </AccountFrame>
  );
}
