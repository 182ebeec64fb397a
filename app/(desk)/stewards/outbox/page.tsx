import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { one, type Query } from '@/app/(account)/form-words';
import { DeskFrame } from '@/components/stewards/desk-frame';
import { JobTable } from '@/components/stewards/job-table';
import { MailTable } from '@/components/stewards/mail-table';
import { Panel } from '@/components/ui/panel';
import { words } from '@/lib/kernel/words';
import { readOutbox, type Outbox } from '@/lib/notices/read-outbox';
import { OUTBOX_PARTS, outboxQuery, type OutboxPart } from '@/lib/notices/schema';
import { freshForm } from '@/lib/server/define-action';
import { enter } from '@/lib/server/lead-on';
import { retry } from '../actions';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('stewards.outbox.title'), robots: { index: false } };

const newKey = (): string => freshForm().key;

export default async function OutboxPage({ searchParams }: Props): Promise<ReactElement> {
  const { ctx } = await enter('outbox.read', '/stewards/outbox');
  const query = await searchParams;
  const found = await readOutbox(ctx, outboxQuery.parse(query));
  if (!found.ok) notFound();
  const { part, counts, mails, next, jobs } = found.value;
  const done = one(query, 'done') === 'retried' ? words('stewards.done.retried') : undefined;
  return (
    <DeskFrame title={words('stewards.outbox.title')} path="/stewards/outbox" done={done}>
      {one(query, 'why') === 'not-parked' ? (
        <div className="mt-4 max-w-text" role="alert">
          <Panel colour="copper">
            <p>{words('stewards.fault.not-parked')}</p>
          </Panel>
        </div>
      ) : null}
      <p className="mt-4 max-w-text">{words('stewards.outbox.lead')}</p>
      <Parts part={part} counts={counts} />
      <div className="mt-6">
        <MailTable part={part} mails={mails} keyOf={newKey} retry={retry} />
      </div>
      {next === null ? null : (
        <p className="mt-6">
          <a href={`/stewards/outbox?part=${part}&before=${next}`}>{words('stewards.outbox.next')}</a>
        </p>
      )}
      <p className="mt-6">{words('stewards.outbox.sent', { count: counts.sent })}</p>
      <h2 className="mt-12">{words('stewards.outbox.jobs.title')}</h2>
      <div className="mt-4">
        <JobTable jobs={jobs} keyOf={newKey} retry={retry} />
      </div>
    </DeskFrame>
  );
}

type PartsProps = { readonly part: OutboxPart; readonly counts: Outbox['counts'] };

function Parts({ part, counts }: PartsProps): ReactElement {
  const count = (of: OutboxPart): number => (of === 'waiting' ? counts.waiting + counts.sending : counts[of]);
  return (
    <nav aria-label={words('stewards.outbox.parts')} className="mt-6">
      <ul className="site-menu" role="list">
        {OUTBOX_PARTS.map((one) => (
          <li key={one}>
            <a href={`/stewards/outbox?part=${one}`} aria-current={one === part ? 'page' : undefined}>
              {words(`stewards.outbox.part.${one}`, { count: count(one) })}
            </a>
          </li>
        ))}
      </ul>
    </nav>
  );
}
