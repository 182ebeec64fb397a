import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { AccountFrame } from '@/components/accounts/account-frame';
import { EntryForm } from '@/components/accounts/entry-form';
import { Press } from '@/components/accounts/press';
import { QrCode } from '@/components/accounts/qr-code';
import { readOwnAccount } from '@/lib/accounts/read-own-account';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { freshForm, type FormState } from '@/lib/server/define-action';
import { findKept } from '@/lib/server/kept-form';
import { enter } from '@/lib/server/lead-on';
import { drawFactorSecret, newFactorSecret, readFactorSecret, writeFactorSecret } from '@/lib/server/second-factor';
import { turnOn } from '../actions';
import { renewCodes, turnOff } from './actions';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('bench.second.title'), robots: { index: false } };

export default async function SecondFactorPage({ searchParams }: Props): Promise<ReactElement> {
  const { ctx } = await enter('account.set-second-factor', '/bench/account/second-factor');
  const own = await readOwnAccount(ctx);
  const kept = await findKept(one(await searchParams, 'look'));
  const account = own.ok ? own.value.account : null;
  return (
    <AccountFrame title={words('bench.second.title')}>
      {account !== null && account.secondFactorOnAt !== null ? (
        <IsOn since={account.secondFactorOnAt} codes={own.ok ? own.value.codesLeft : 0} first={kept} />
      ) : (
        <SetUp email={account?.email ?? ''} first={kept} />
      )}
    </AccountFrame>
  );
}

/** After a refusal the same secret is shown: the authenticator has it already. */
function secretOf(first: FormState | null): Buffer {
  const typed = first?.values['secret'];
  return (typeof typed === 'string' ? readFactorSecret(typed) : null) ?? newFactorSecret();
}

function SetUp({ email, first }: { readonly email: string; readonly first: FormState | null }): ReactElement {
  const secret = secretOf(first);
  const text = writeFactorSecret(secret);
  return (
    <>
      <p className="mt-4">{words('bench.second.lead')}</p>
      <h2 className="mt-8 text-lead">{words('bench.second.scan')}</h2>
      <div className="mt-3">
        <QrCode title={words('bench.second.qr')} {...drawFactorSecret(secret, email)} />
      </div>
      <p className="mt-4 mb-6">
        {words('bench.second.type')}: <span className="code-text font-strong">{text}</span>
      </p>
      <EntryForm
        action={turnOn}
        first={first ?? freshForm()}
        {...formWords()}
        hidden={{ secret: text }}
        submit={words('bench.second.submit')}
        fields={[
          {
            name: 'code',
            type: 'code',
            label: words('bench.second.codeLabel'),
            hint: words('bench.second.codeHint'),
            autoComplete: 'one-time-code',
          },
        ]}
      />
    </>
  );
}

type OnProps = { readonly since: Date; readonly codes: number; readonly first: FormState | null };

function IsOn({ since, codes, first }: OnProps): ReactElement {
  const state = first ?? freshForm();
  const { busy } = formWords();
  return (
    <>
      <p className="mt-4">{words('bench.second.on', { on: sayDate(calendarDateOf(since)), codes })}</p>
      <h2 className="mt-8">{words('bench.second.renew')}</h2>
      <p className="my-3">{words('bench.second.renewLead')}</p>
      <Press action={renewCodes} first={state} busy={busy} submit={words('bench.second.renew')} />
      <h2 className="mt-8">{words('bench.second.off')}</h2>
      <p className="my-3">{words('bench.second.offLead')}</p>
      <Press action={turnOff} first={freshForm()} busy={busy} submit={words('bench.second.off')} />
    </>
  );
}
