import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { EntryForm } from '@/components/accounts/entry-form';
import { PageHeading } from '@/components/ui/page-heading';
import { words } from '@/lib/kernel/words';
import { freshForm } from '@/lib/server/define-action';
import { findKept } from '@/lib/server/kept-form';
import { beginAccount } from '../actions';
import { formWords, one, type Query } from '../form-words';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('accounts.signUp.title'), description: words('accounts.signUp.description') };

export default async function SignUpPage({ searchParams }: Props): Promise<ReactElement> {
  const first = (await findKept(one(await searchParams, 'look'))) ?? freshForm();
  return (
    <div className="max-w-text">
      <PageHeading>{words('accounts.signUp.title')}</PageHeading>
      <p className="mt-4 mb-6">{words('accounts.signUp.lead')}</p>
      <EntryForm
        action={beginAccount}
        first={first}
        {...formWords()}
        submit={words('accounts.signUp.submit')}
        fields={[
          { name: 'email', type: 'email', label: words('accounts.field.email'), autoComplete: 'email' },
          { name: 'name', type: 'text', label: words('accounts.field.name'), hint: words('accounts.field.nameHint'), autoComplete: 'name' },
          {
            name: 'password',
            type: 'password',
            label: words('accounts.field.password'),
            hint: words('accounts.field.newPasswordHint'),
            autoComplete: 'new-password',
          },
        ]}
      />
      <p className="mt-8">{words.rich('accounts.signUp.have', { link: (said) => <a href="/sign-in">{said}</a> })}</p>
    </div>
  );
}
