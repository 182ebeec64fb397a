import type { ReactElement } from 'react';
import { DefinitionList } from '@/components/ui/definition-list';
import type { Account } from '@/lib/accounts/domain/account';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';

const day = (at: Date): string => sayDate(calendarDateOf(at));

function stateOf({ state, leavingAt }: Account): string {
  if (state === 'leaving' && leavingAt !== null) return words('stewards.account.leavingOn', { on: day(leavingAt) });
  return words(`stewards.state.${state}`);
}

function factorOf({ secondFactorOnAt }: Account): string {
  return secondFactorOnAt === null
    ? words('stewards.account.secondOff')
    : words('stewards.account.secondOn', { on: day(secondFactorOnAt) });
}

type Props = { readonly account: Account; readonly sessions: number };

/** What a steward may know of an account, and the ways to act on it. */
export function AccountFacts({ account, sessions }: Props): ReactElement {
  const { id, email, role, state, madeAt, isDemo } = account;
  const here = `/stewards/accounts/${id}`;
  const close = state === 'closed' ? words('stewards.account.reopen') : words('stewards.account.close');
  return (
    <>
      <DefinitionList
        entries={[
          { id: 'email', name: words('stewards.accounts.email'), value: <span className="break-all">{email}</span> },
          {
            id: 'role',
            name: words('stewards.accounts.role'),
            value: words(`stewards.role.${role}`),
            act: <a href={`${here}/role`}>{words('stewards.account.changeRole')}</a>,
          },
          {
            id: 'state',
            name: words('stewards.accounts.state'),
            value: stateOf(account),
            act: state === 'leaving' ? undefined : <a href={`${here}/close`}>{close}</a>,
          },
          { id: 'since', name: words('stewards.accounts.since'), value: day(madeAt) },
          { id: 'second', name: words('stewards.account.second'), value: factorOf(account) },
          { id: 'sessions', name: words('stewards.account.sessions'), value: words('stewards.account.sessionsCount', { count: sessions }) },
        ]}
      />
      {isDemo ? <p className="mt-4">{words('stewards.account.demo')}</p> : null}
    </>
  );
}
