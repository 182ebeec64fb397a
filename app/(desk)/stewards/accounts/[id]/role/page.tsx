import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { EntryForm } from '@/components/accounts/entry-form';
import { DeskFrame } from '@/components/stewards/desk-frame';
import { ROLES } from '@/lib/access/domain/actor';
import { words } from '@/lib/kernel/words';
import { freshForm } from '@/lib/server/define-action';
import { findKept } from '@/lib/server/kept-form';
import { giveRole } from '../../../actions';
import { findAccount } from '../../../find-account';
import { reasonField } from '../../../reason-field';

type Props = { readonly params: Promise<{ readonly id: string }>; readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('stewards.account.changeRole'), robots: { index: false } };

export default async function RolePage({ params, searchParams }: Props): Promise<ReactElement> {
  const { account } = await findAccount((await params).id, 'role.grant', (id) => `/stewards/accounts/${id}/role`);
  const { id, name, role } = account;
  const first = (await findKept(one(await searchParams, 'look'))) ?? freshForm();
  return (
    <DeskFrame title={words('stewards.roles.title', { name })} path="/stewards">
      <div className="mt-4 max-w-text">
        <p>{words('stewards.roles.lead', { name, role })}</p>
        <p className="mt-3 mb-6">{words('stewards.roles.then')}</p>
        <EntryForm
          action={giveRole}
          first={first}
          {...formWords()}
          hidden={{ id, from: role }}
          submit={words('stewards.roles.submit')}
          fields={[
            {
              name: 'role',
              type: 'choice',
              label: words('stewards.roles.field'),
              none: words('stewards.roles.none'),
              options: ROLES.filter((one) => one !== 'reader').map((value) => ({ value, label: words(`stewards.roles.means.${value}`) })),
            },
            reasonField(),
          ]}
        />
        <p className="mt-8">
          <a href={`/stewards/accounts/${id}`}>{words('stewards.account.back')}</a>
        </p>
      </div>
    </DeskFrame>
  );
}
