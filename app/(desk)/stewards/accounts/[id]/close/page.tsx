import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { EntryForm } from '@/components/accounts/entry-form';
import { DeskFrame } from '@/components/stewards/desk-frame';
import { words } from '@/lib/kernel/words';
import { freshForm } from '@/lib/server/define-action';
import { findKept } from '@/lib/server/kept-form';
import { close, reopen } from '../../../actions';
import { findAccount } from '../../../find-account';
import { reasonField } from '../../../reason-field';

type Props = { readonly params: Promise<{ readonly id: string }>; readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('stewards.account.close'), robots: { index: false } };

/** Closes an account that is open, opens one that is closed. */
export default async function ClosePage({ params, searchParams }: Props): Promise<ReactElement> {
  const { account } = await findAccount((await params).id, 'account.close', (id) => `/stewards/accounts/${id}/close`);
  const { id, name, role, state } = account;
  const first = (await findKept(one(await searchParams, 'look'))) ?? freshForm();
  const isClosed = state === 'closed';
  return (
    <DeskFrame title={isClosed ? words('stewards.opening.title', { name }) : words('stewards.closing.title', { name })} path="/stewards">
      <div className="mt-4 max-w-text">
        <p className="mb-6">{isClosed ? words('stewards.opening.lead', { role }) : words('stewards.closing.lead')}</p>
        <EntryForm
          action={isClosed ? reopen : close}
          first={first}
          {...formWords()}
          hidden={{ id }}
          submit={isClosed ? words('stewards.opening.submit') : words('stewards.closing.submit')}
          fields={[reasonField()]}
        />
        <p className="mt-8">
          <a href={`/stewards/accounts/${id}`}>{words('stewards.account.back')}</a>
        </p>
      </div>
    </DeskFrame>
  );
}
