import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { EntryForm } from '@/components/accounts/entry-form';
import { PageHeading } from '@/components/ui/page-heading';
import { words } from '@/lib/kernel/words';
import { freshForm } from '@/lib/server/define-action';
import { findKept } from '@/lib/server/kept-form';
import { sendReset } from '../actions';
import { formWords, one, type Query } from '../form-words';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('accounts.reset.title'), description: words('accounts.reset.description') };

export default async function ResetPage({ searchParams }: Props): Promise<ReactElement> {
  const first = (await findKept(one(await searchParams, 'look'))) ?? freshForm();
  return (
    <div className="max-w-text">
      <PageHeading>{words('accounts.reset.title')}</PageHeading>
      <p className="mt-4 mb-6">{words('accounts.reset.lead')}</p>
      <EntryForm
        action={sendReset}
        first={first}
        {...formWords()}
        submit={words('accounts.reset.submit')}
        fields={[{ name: 'email', type: 'email', label: words('accounts.field.email'), autoComplete: 'email' }]}
      />
    </div>
  );
}
