import type { ReactElement } from 'react';
import { Panel } from '@/components/ui/panel';
import type { Account } from '@/lib/accounts/domain/account';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import type { EntryState } from './entry-form';
import { Press } from './press';

type Act = (prev: EntryState, form: FormData) => Promise<EntryState>;
type Props = {
  readonly account: Pick<Account, 'email' | 'role' | 'confirmedAt' | 'leavingAt'>;
  readonly wantsFactor: boolean;
  readonly confirmAgain: Act;
  readonly stay: Act;
  readonly first: EntryState;
  readonly busy: string;
};

/** What somebody has to know or do before anything else on their bench. */
export function BenchNotices({ account, wantsFactor, confirmAgain, stay, first, busy }: Props): ReactElement {
  const { email, role, confirmedAt, leavingAt } = account;
  return (
    <div className="mt-6 flex flex-col gap-4">
      {leavingAt === null ? null : (
        <Panel colour="copper" label={words('bench.leaving.label')}>
          <p className="mb-3">{words('bench.leaving.lead', { on: sayDate(calendarDateOf(leavingAt)) })}</p>
          <Press action={stay} first={first} busy={busy} submit={words('bench.leaving.submit')} kind="primary" />
        </Panel>
      )}
      {confirmedAt !== null ? null : (
        <Panel colour="ash" label={words('bench.confirm.label')}>
          <p className="mb-3">{words('bench.confirm.lead', { email: email ?? '' })}</p>
          <Press action={confirmAgain} first={first} busy={busy} submit={words('bench.confirm.submit')} />
        </Panel>
      )}
      {wantsFactor ? (
        <Panel colour="ash" label={words('bench.factor.label')}>
          <p>{words('bench.factor.lead', { role })}</p>
          <p className="mt-2">
            <a href="/bench/account/second-factor">{words('bench.factor.link')}</a>
          </p>
        </Panel>
      ) : null}
    </div>
  );
}
