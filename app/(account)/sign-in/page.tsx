import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { DemoPeople } from '@/components/accounts/demo-people';
import { EntryForm } from '@/components/accounts/entry-form';
import { Note } from '@/components/accounts/note';
import { PageHeading } from '@/components/ui/page-heading';
import { nextPlace } from '@/lib/accounts/domain/next-place';
import { listDemoPeople } from '@/lib/accounts/list-demo-people';
import { words } from '@/lib/kernel/words';
import { makeCtx } from '@/lib/server/ctx';
import { freshForm } from '@/lib/server/define-action';
import { enterByPassword } from '../actions';
import { formWords, one, type Query } from '../form-words';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('accounts.signIn.title'), description: words('accounts.signIn.description') };

const DONE = ['confirmed', 'address', 'reset', 'leaving', 'out'] as const;

export default async function SignInPage({ searchParams }: Props): Promise<ReactElement> {
  const query = await searchParams;
  const next = nextPlace(one(query, 'next'), '');
  const done = DONE.find((name) => name === one(query, 'done'));
  return (
    <div className="max-w-text">
      {done === undefined ? null : <Note>{words(`accounts.signIn.done.${done}`)}</Note>}
      <PageHeading>{words('accounts.signIn.title')}</PageHeading>
      {one(query, 'why') === 'go-on' ? <p className="mt-4">{words('accounts.signIn.why')}</p> : null}
      <div className="mt-6">
        <EntryForm
          action={enterByPassword}
          first={freshForm()}
          {...formWords()}
          hidden={next === '' ? {} : { next }}
          submit={words('accounts.signIn.submit')}
          fields={[
            { name: 'email', type: 'email', label: words('accounts.field.email'), autoComplete: 'username' },
            { name: 'password', type: 'password', label: words('accounts.field.password'), autoComplete: 'current-password' },
          ]}
        />
      </div>
      <ul className="mt-8" role="list">
        <li className="py-1">
          <a href="/reset">{words('accounts.signIn.forgot')}</a>
        </li>
        <li className="py-1">
          <a href="/sign-in/link">{words('accounts.signIn.byLink.title')}</a>
        </li>
        <li className="py-1">{words.rich('accounts.signIn.new', { link: (said) => <a href="/sign-up">{said}</a> })}</li>
      </ul>
      <DemoPeople people={await listDemoPeople(makeCtx())} />
    </div>
  );
}
