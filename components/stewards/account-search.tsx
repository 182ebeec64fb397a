import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { SelectField } from '@/components/ui/select-field';
import { TextField } from '@/components/ui/text-field';
import { ROLES } from '@/lib/access/domain/actor';
import { words } from '@/lib/kernel/words';

type Props = { readonly q: string; readonly role: string | undefined };

/** Asks for accounts by a plain GET, so that what was found has an address. */
export function AccountSearch({ q, role }: Props): ReactElement {
  return (
    <search>
      <form action="/stewards" method="get" className="flex max-w-text flex-col gap-4" aria-label={words('stewards.accounts.label')}>
        <TextField
          id="q"
          name="q"
          type="search"
          label={words('stewards.accounts.search')}
          defaultValue={q}
          maxLength={200}
          autoComplete="off"
        />
        <SelectField
          id="role"
          name="role"
          label={words('stewards.accounts.role')}
          none={words('stewards.accounts.roleNone')}
          options={ROLES.filter((one) => one !== 'reader').map((one) => ({ value: one, label: words(`stewards.role.${one}`) }))}
          chosen={role}
        />
        <div>
          <Button kind="plain">{words('stewards.accounts.submit')}</Button>
        </div>
      </form>
    </search>
  );
}
