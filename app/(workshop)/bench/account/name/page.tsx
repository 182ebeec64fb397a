import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { AccountFrame } from '@/components/accounts/account-frame';
import { EntryForm } from '@/components/accounts/entry-form';
import { words } from '@/lib/kernel/words';
import { freshForm } from '@/lib/server/define-action';
import { findKept } from '@/lib/server/kept-form';
import { enter } from '@/lib/server/lead-on';
import { rename } from '../actions';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('bench.name.title'), robots: { index: false } };

export default async function NamePage({ searchParams }: Props): Promise<ReactElement> {
  const { actor } = await enter('account.rename', '/bench/account/name');
  const first = (await findKept(one(await searchParams, 'look'))) ?? freshForm();
  return (
    <AccountFrame title={words('bench.name.title')}>
      <div className="mt-6">
        <EntryForm
          action={rename}
          first={first}
          {...formWords()}
          submit={words('bench.name.submit')}
          fields={[
            {
              name: 'name',
              type: 'text',
              label: words('accounts.field.name'),
              hint: words('accounts.field.nameHint'),
              autoComplete: 'name',
              value: actor.name,
            },
          ]}
        />
      </div>
    </AccountFrame>
  );
}
