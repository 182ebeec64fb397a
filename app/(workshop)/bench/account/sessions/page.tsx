import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { AccountFrame } from '@/components/accounts/account-frame';
import { deviceWords } from '@/components/accounts/device-words';
import { Note } from '@/components/accounts/note';
import { Press } from '@/components/accounts/press';
import { DataTable, type Row } from '@/components/ui/data-table';
import type { ListedSession } from '@/lib/accounts/domain/session';
import { listOwnSessions } from '@/lib/accounts/list-own-sessions';
import { sayInstant } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { freshForm } from '@/lib/server/define-action';
import { findKept } from '@/lib/server/kept-form';
import { enter } from '@/lib/server/lead-on';
import { endOthers, endSession } from '../actions';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('bench.sessions.title'), robots: { index: false } };

export default async function SessionsPage({ searchParams }: Props): Promise<ReactElement> {
  const query = await searchParams;
  const { ctx, session } = await enter('account.read-sessions', '/bench/account/sessions');
  const listed = await listOwnSessions(ctx, session.id);
  const sessions = listed.ok ? listed.value : [];
  const done = (['session', 'others'] as const).find((name) => name === one(query, 'done'));
  return (
    <AccountFrame title={words('bench.sessions.title')}>
      <div className="mt-4">{done === undefined ? null : <Note>{words(`bench.done.${done}`)}</Note>}</div>
      <p className="mb-6">{words('bench.sessions.lead')}</p>
      <DataTable
        id="sessions"
        caption={words('bench.sessions.caption')}
        columns={(['device', 'since', 'seen', 'act'] as const).map((id) => ({ id, heading: words(`bench.sessions.${id}`) }))}
        rows={sessions.map(rowOf)}
      />
      {sessions.length < 2 ? null : (
        <div className="mt-8">
          <Press
            action={endOthers}
            first={(await findKept(one(query, 'look'))) ?? freshForm()}
            busy={formWords().busy}
            submit={words('bench.sessions.others')}
            kind="primary"
          />
        </div>
      )}
    </AccountFrame>
  );
}

function rowOf({ handle, agent, madeAt, seenAt, here }: ListedSession): Row {
  const device = deviceWords(agent);
  return {
    id: handle,
    cells: {
      device,
      since: <time dateTime={madeAt.toISOString()}>{sayInstant(madeAt)}</time>,
      seen: <time dateTime={seenAt.toISOString()}>{sayInstant(seenAt)}</time>,
      act: here ? (
        words('bench.sessions.here')
      ) : (
        <Press
          action={endSession}
          first={freshForm()}
          hidden={{ handle }}
          busy={formWords().busy}
          submit={words('bench.sessions.end')}
          about={device}
        />
      ),
    },
  };
}
