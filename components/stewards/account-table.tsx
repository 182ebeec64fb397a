import type { ReactElement } from 'react';
import { DataTable } from '@/components/ui/data-table';
import type { Account } from '@/lib/accounts/domain/account';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';

const COLUMNS = (['name', 'email', 'role', 'state', 'since'] as const).map((id) => ({ id, heading: words(`stewards.accounts.${id}`) }));

/** Accounts that were found, each with the way to it. */
export function AccountTable({ accounts }: { readonly accounts: readonly Account[] }): ReactElement {
  if (accounts.length === 0) return <p>{words('stewards.accounts.none')}</p>;
  return (
    <DataTable
      id="accounts"
      caption={words('stewards.accounts.caption')}
      columns={COLUMNS}
      rows={accounts.map(({ id, name, email, role, state, madeAt }) => ({
        id,
        cells: {
          name: <a href={`/stewards/accounts/${id}`}>{name}</a>,
          email: <span className="break-words">{email}</span>,
          role: words(`stewards.role.${role}`),
          state: words(`stewards.state.${state}`),
          since: sayDate(calendarDateOf(madeAt)),
        },
      }))}
    />
  );
}
