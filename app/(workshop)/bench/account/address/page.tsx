import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { AccountFrame } from '@/components/accounts/account-frame';
import { EntryForm } from '@/components/accounts/entry-form';
import { readOwnAccount } from '@/lib/accounts/read-own-account';
import { words } from '@/lib/kernel/words';
import { freshForm } from '@/lib/server/define-action';
import { findKept } from '@/lib/server/kept-form';
import { enter } from '@/lib/server/lead-on';
import { changeAddress } from '../actions';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('bench.address.title'), robots: { index: false } };

export default async function AddressPage({ searchParams }: Props): Promise<ReactElement> {
  const { ctx } = await enter('account.change-address', '/bench/account/address');
  const own = await readOwnAccount(ctx);
  const first = (await findKept(one(await searchParams, 'look'))) ?? freshForm();
  return (
    <AccountFrame title={words('bench.address.title')}>
      <p className="mt-4">{words('bench.address.lead', { email: own.ok ? own.value.account.email : '' })}</p>
      <div className="mt-6">
        <EntryForm
          action={changeAddress}
          first={first}
          {...formWords()}
          submit={words('bench.address.submit')}
          fields={[{ name: 'email', type: 'email', label: words('bench.address.field'), autoComplete: 'email' }]}
        />
      </div>
    </AccountFrame>
  );
}
