import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { AccountFrame } from '@/components/accounts/account-frame';
import type { EntryFieldPlan } from '@/components/accounts/entry-field';
import { EntryForm } from '@/components/accounts/entry-form';
import type { Preferences } from '@/lib/accounts/domain/account';
import { CURRENCIES } from '@/lib/accounts/domain/currencies';
import { readOwnAccount } from '@/lib/accounts/read-own-account';
import { LOCALE, words } from '@/lib/kernel/words';
import { listRegions } from '@/lib/regions/list-regions';
import { freshForm } from '@/lib/server/define-action';
import { findKept } from '@/lib/server/kept-form';
import { enter } from '@/lib/server/lead-on';
import { keepPreferences } from '../actions';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('bench.preferences.title'), robots: { index: false } };

const NAMES = new Intl.DisplayNames(LOCALE, { type: 'currency' });

export default async function PreferencesPage({ searchParams }: Props): Promise<ReactElement> {
  const { ctx } = await enter('account.set-preferences', '/bench/account/preferences');
  const own = await readOwnAccount(ctx);
  const regions = await listRegions(ctx);
  const first = (await findKept(one(await searchParams, 'look'))) ?? freshForm();
  const now = own.ok ? own.value.account.preferences : { region: null, currency: null, units: 'metric' as const };
  return (
    <AccountFrame title={words('bench.preferences.title')}>
      <div className="mt-6">
        <EntryForm
          action={keepPreferences}
          first={first}
          {...formWords()}
          submit={words('bench.preferences.submit')}
          fields={fieldsOf(now, regions)}
        />
      </div>
    </AccountFrame>
  );
}

function fieldsOf(now: Preferences, regions: readonly { readonly code: string; readonly name: string }[]): readonly EntryFieldPlan[] {
  return [
    {
      name: 'region',
      type: 'choice',
      label: words('accounts.field.region'),
      hint: words('accounts.field.regionHint'),
      none: words('accounts.field.regionNone'),
      options: regions.map(({ code, name }) => ({ value: code, label: name })),
      value: now.region ?? '',
    },
    {
      name: 'currency',
      type: 'choice',
      label: words('accounts.field.currency'),
      none: words('accounts.field.currencyNone'),
      options: CURRENCIES.map((code) => ({ value: code, label: `${code}, ${NAMES.of(code) ?? code}` })),
      value: now.currency ?? '',
    },
    {
      name: 'units',
      type: 'choice',
      label: words('accounts.field.units'),
      options: [
        { value: 'metric', label: words('accounts.field.metric') },
        { value: 'imperial', label: words('accounts.field.imperial') },
      ],
      value: now.units,
    },
  ];
}
