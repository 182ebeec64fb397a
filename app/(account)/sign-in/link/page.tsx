import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { EntryForm } from '@/components/accounts/entry-form';
import { PageHeading } from '@/components/ui/page-heading';
import { words } from '@/lib/kernel/words';
import { freshForm } from '@/lib/server/define-action';
import { findKept } from '@/lib/server/kept-form';
import { sendLink } from '../../actions';
import { formWords, one, type Query } from '../../form-words';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('accounts.signIn.byLink.title'), description: words('accounts.signIn.description') };

export default async function ByLinkPage({ searchParams }: Props): Promise<ReactElement> {
  const first = (await findKept(one(await searchParams, 'look'))) ?? freshForm();
  return (
    <div className="max-w-text">
      <PageHeading>{words('accounts.signIn.byLink.title')}</PageHeading>
      <p className="mt-4 mb-6">{words('accounts.signIn.byLink.lead')}</p>
      <EntryForm
        action={sendLink}
        first={first}
        {...formWords()}
        submit={words('accounts.signIn.byLink.submit')}
        fields={[{ name: 'email', type: 'email', label: words('accounts.field.email'), autoComplete: 'email' }]}
      />
      <p className="mt-8">
        <a href="/sign-in">{words('accounts.tooMany.signIn')}</a>
      </p>
    </div>
  );
}
