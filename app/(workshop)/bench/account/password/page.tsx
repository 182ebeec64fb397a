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
import { renewPassword } from '../actions';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('bench.password.title'), robots: { index: false } };

export default async function PasswordPage({ searchParams }: Props): Promise<ReactElement> {
  const { ctx } = await enter('account.change-password', '/bench/account/password');
  const own = await readOwnAccount(ctx);
  const first = (await findKept(one(await searchParams, 'look'))) ?? freshForm();
  if (own.ok && !own.value.hasPassword) return <NoPassword />;
  return (
    <AccountFrame title={words('bench.password.title')}>
      <p className="mt-4 mb-6">{words('bench.password.lead')}</p>
      <EntryForm
        action={renewPassword}
        first={first}
        {...formWords()}
        submit={words('bench.password.submit')}
        fields={[
          { name: 'current', type: 'password', label: words('accounts.field.current'), autoComplete: 'current-password' },
          {
            name: 'password',
            type: 'password',
            label: words('accounts.field.newPassword'),
            hint: words('accounts.field.newPasswordHint'),
            autoComplete: 'new-password',
          },
        ]}
      />
    </AccountFrame>
  );
}

const NoPassword = (): ReactElement => (
  <AccountFrame title={words('bench.password.title')}>
    <p className="mt-4">{words.rich('bench.password.none', { link: (said) => <a href="/reset">{said}</a> })}</p>
  </AccountFrame>
);
