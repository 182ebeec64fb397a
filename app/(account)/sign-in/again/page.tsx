import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { EntryForm } from '@/components/accounts/entry-form';
import { PageHeading } from '@/components/ui/page-heading';
import { nextPlace } from '@/lib/accounts/domain/next-place';
import { words } from '@/lib/kernel/words';
import { freshForm } from '@/lib/server/define-action';
import { enter } from '@/lib/server/lead-on';
import { typeAgain } from '../../actions';
import { formWords, one, type Query } from '../../form-words';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('accounts.again.title'), robots: { index: false } };

export default async function AgainPage({ searchParams }: Props): Promise<ReactElement> {
  const next = nextPlace(one(await searchParams, 'next'), '/bench/account');
  await enter('account.sign-in-again', next);
  return (
    <div className="max-w-text">
      <PageHeading>{words('accounts.again.title')}</PageHeading>
      <p className="mt-4 mb-6">{words('accounts.again.lead')}</p>
      <EntryForm
        action={typeAgain}
        first={freshForm()}
        {...formWords()}
        hidden={{ next }}
        submit={words('accounts.again.submit')}
        fields={[{ name: 'password', type: 'password', label: words('accounts.field.password'), autoComplete: 'current-password' }]}
      />
      <p className="mt-8">{words.rich('accounts.again.noPassword', { link: (said) => <a href="/reset">{said}</a> })}</p>
    </div>
  );
}
