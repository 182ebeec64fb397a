import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import type { ReactElement, ReactNode } from 'react';
import { one, type Query } from '@/app/(account)/form-words';
import { AccountFrame } from '@/components/accounts/account-frame';
import { Note } from '@/components/accounts/note';
import { DefinitionList } from '@/components/ui/definition-list';
import { readOwnAccount, type OwnAccount } from '@/lib/accounts/read-own-account';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { listRegions } from '@/lib/regions/list-regions';
import { doorOf, enter } from '@/lib/server/lead-on';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('bench.account.title'), robots: { index: false } };

const DONE = ['name', 'password', 'factorOff', 'preferences'] as const;

export default async function AccountPage({ searchParams }: Props): Promise<ReactElement> {
  const said = one(await searchParams, 'done');
  const { ctx } = await enter('account.read-own', '/bench/account');
  const own = await readOwnAccount(ctx);
  if (!own.ok) redirect(doorOf(own.error.kind, '/bench/account') ?? '/bench');
  const regions = await listRegions(ctx);
  const region = regions.find(({ code }) => code === own.value.account.preferences.region)?.name ?? null;
  const done = DONE.find((name) => name === said);
  return (
    <AccountFrame title={words('bench.account.title')} back={{ href: '/bench', text: words('bench.title') }}>
      <div className="mt-4">
        {done === undefined ? null : <Note>{words(`bench.done.${done}`)}</Note>}
        {said === 'address' ? <Note>{words('bench.done.addressPlain')}</Note> : null}
      </div>
      <h2 className="mt-6">{words('bench.account.part.you')}</h2>
      <DefinitionList entries={aboutYou(own.value, region)} />
      <h2 className="mt-8">{words('bench.account.part.signIn')}</h2>
      <DefinitionList entries={howYouSignIn(own.value)} />
      <h2 className="mt-8">{words('bench.account.part.leave')}</h2>
      <DefinitionList entries={takeAway()} />
    </AccountFrame>
  );
}

type Entry = { readonly id: string; readonly name: string; readonly value: ReactNode; readonly act?: ReactNode };

const to = (page: string, text: string): ReactElement => <a href={`/bench/account/${page}`}>{text}</a>;

function aboutYou({ account }: OwnAccount, region: string | null): readonly Entry[] {
  const { currency, units } = account.preferences;
  const chosen = [region, currency, units === 'imperial' ? words('accounts.field.imperial') : words('accounts.field.metric')];
  const email = account.confirmedAt === null ? `${account.email} (${words('bench.account.unconfirmed')})` : account.email;
  return [
    { id: 'name', name: words('bench.account.name'), value: account.name, act: to('name', words('bench.account.mendName')) },
    { id: 'email', name: words('bench.account.email'), value: email, act: to('address', words('bench.account.mendEmail')) },
    { id: 'role', name: words('bench.account.role'), value: words(`accounts.role.${account.role}`) },
    {
      id: 'preferences',
      name: words('bench.account.preferences'),
      value: chosen.filter((part) => part !== null).join(', '),
      act: to('preferences', words('bench.account.mendPreferences')),
    },
    { id: 'since', name: words('bench.account.sinceName'), value: sayDate(calendarDateOf(account.madeAt)) },
  ];
}

function howYouSignIn({ account, hasPassword, codesLeft }: OwnAccount): readonly Entry[] {
  const on = account.secondFactorOnAt;
  return [
    {
      id: 'password',
      name: words('bench.account.password'),
      value: words(hasPassword ? 'bench.account.hasPassword' : 'bench.account.noPassword'),
      act: to('password', words('bench.account.mendPassword')),
    },
    {
      id: 'factor',
      name: words('bench.account.factor'),
      value:
        on === null
          ? words('bench.account.factorOff')
          : words('bench.account.factorOn', { on: sayDate(calendarDateOf(on)), codes: codesLeft }),
      act: to('second-factor', words('bench.account.mendFactor')),
    },
    {
      id: 'sessions',
      name: words('bench.account.sessions'),
      value: words('bench.account.sessionsText'),
      act: to('sessions', words('bench.account.mendSessions')),
    },
  ];
}

function takeAway(): readonly Entry[] {
  return [
    {
      id: 'export',
      name: words('bench.account.export'),
      value: words('bench.account.exportText'),
      act: to('export', words('bench.account.mendExport')),
    },
    {
      id: 'delete',
      name: words('bench.account.delete'),
      value: words('bench.account.deleteText'),
      act: to('delete', words('bench.account.mendDelete')),
    },
  ];
}
