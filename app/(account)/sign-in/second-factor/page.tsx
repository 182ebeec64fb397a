import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import type { ReactElement } from 'react';
import { EntryForm } from '@/components/accounts/entry-form';
import { LinkButton } from '@/components/ui/link-button';
import { PageHeading } from '@/components/ui/page-heading';
import { nextPlace } from '@/lib/accounts/domain/next-place';
import { words } from '@/lib/kernel/words';
import { freshForm } from '@/lib/server/define-action';
import { enter } from '@/lib/server/lead-on';
import { giveCode } from '../../actions';
import { formWords, one, type Query } from '../../form-words';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('accounts.factor.title'), robots: { index: false } };

export default async function SecondFactorPage({ searchParams }: Props): Promise<ReactElement> {
  const next = nextPlace(one(await searchParams, 'next'), '/bench');
  const { actor } = await enter('account.give-second-factor', next);
  if (actor.secondFactor === 'given') redirect(next);
  if (actor.secondFactor === 'off') return <SetUpFirst />;
  return (
    <div className="max-w-text">
      <PageHeading>{words('accounts.factor.title')}</PageHeading>
      <p className="mt-4 mb-6">{words('accounts.factor.lead')}</p>
      <EntryForm
        action={giveCode}
        first={freshForm()}
        {...formWords()}
        hidden={{ next }}
        submit={words('accounts.factor.submit')}
        fields={[
          {
            name: 'code',
            type: 'code',
            label: words('accounts.field.code'),
            hint: words('accounts.field.codeHint'),
            autoComplete: 'one-time-code',
          },
        ]}
      />
      <p className="mt-8">{words.rich('accounts.factor.lost', { link: (said) => <a href="/contact">{said}</a> })}</p>
    </div>
  );
}

function SetUpFirst(): ReactElement {
  return (
    <div className="max-w-text">
      <PageHeading>{words('accounts.factor.needed.title')}</PageHeading>
      <p className="mt-4 mb-6">{words('accounts.factor.needed.lead')}</p>
      <LinkButton href="/bench/account/second-factor">{words('accounts.factor.needed.link')}</LinkButton>
    </div>
  );
}
