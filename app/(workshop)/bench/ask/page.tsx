import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { AccountFrame } from '@/components/accounts/account-frame';
import { EntryForm } from '@/components/accounts/entry-form';
import { Note } from '@/components/accounts/note';
import { Press } from '@/components/accounts/press';
import { RoleRequests } from '@/components/accounts/role-requests';
import type { AccountRole } from '@/lib/access/domain/actor';
import type { RoleRequest } from '@/lib/accounts/domain/role-request';
import { readOwnAccount } from '@/lib/accounts/read-own-account';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { listRegions } from '@/lib/regions/list-regions';
import { freshForm, type FormState } from '@/lib/server/define-action';
import { findKept } from '@/lib/server/kept-form';
import { doorOf, enter } from '@/lib/server/lead-on';
import { ask, withdraw } from '../actions';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('bench.ask.title'), robots: { index: false } };

export default async function AskPage({ searchParams }: Props): Promise<ReactElement> {
  const query = await searchParams;
  const { ctx, actor } = await enter('account.read-own', '/bench/ask');
  const own = await readOwnAccount(ctx);
  if (!own.ok) redirect(doorOf(own.error.kind, '/bench/ask') ?? '/bench');
  const { requests } = own.value;
  const waiting = requests.find(({ state }) => state === 'waiting');
  const done = (['ask', 'withdrawn'] as const).find((name) => name === one(query, 'done'));
  return (
    <AccountFrame title={words('bench.ask.title')} back={{ href: '/bench', text: words('bench.title') }}>
      <div className="mt-4">{done === undefined ? null : <Note>{words(`bench.done.${done}`)}</Note>}</div>
      <NotMaker role={actor.role} />
      {waiting === undefined ? null : <Waiting request={waiting} />}
      {actor.role === 'maker' && waiting === undefined ? (
        <AskForm first={(await findKept(one(query, 'look'))) ?? freshForm()} regions={await listRegions(ctx)} />
      ) : null}
      <RoleRequests requests={requests.filter(({ state }) => state !== 'waiting')} />
    </AccountFrame>
  );
}

function NotMaker({ role }: { readonly role: AccountRole }): ReactElement | null {
  return role === 'maker' ? null : <p>{words('bench.ask.notMaker', { role })}</p>;
}

function Waiting({ request }: { readonly request: RoleRequest }): ReactElement {
  return (
    <>
      <p className="mb-4">{words('bench.ask.waiting', { on: sayDate(calendarDateOf(request.madeAt)) })}</p>
      <Press
        action={withdraw}
        first={freshForm()}
        hidden={{ id: request.id }}
        busy={formWords().busy}
        submit={words('bench.ask.withdraw')}
      />
    </>
  );
}

type FormProps = { readonly first: FormState; readonly regions: readonly { readonly code: string; readonly name: string }[] };

function AskForm({ first, regions }: FormProps): ReactElement {
  return (
    <>
      <p className="mb-6">{words('bench.ask.lead')}</p>
      <EntryForm
        action={ask}
        first={first}
        {...formWords()}
        submit={words('bench.ask.submit')}
        fields={[{ name: 'why', type: 'long-text', label: words('accounts.field.why'), hint: words('accounts.field.whyHint') }]}
        group={{
          name: 'regions',
          legend: words('accounts.field.places'),
          hint: words('accounts.field.placesHint'),
          options: regions.map(({ code, name }) => ({ value: code, label: name })),
        }}
      />
    </>
  );
}
