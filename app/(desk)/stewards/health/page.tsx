import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { DeskFrame } from '@/components/stewards/desk-frame';
import { Instant } from '@/components/stewards/instant';
import { DataTable } from '@/components/ui/data-table';
import { DefinitionList } from '@/components/ui/definition-list';
import { words } from '@/lib/kernel/words';
import { readServiceState, type ServiceState } from '@/lib/notices/read-service-state';
import { enter } from '@/lib/server/lead-on';

export const metadata: Metadata = { title: words('stewards.health.title'), robots: { index: false } };

const COLUMNS = [
  { id: 'worker', heading: words('stewards.health.workerName') },
  { id: 'began', heading: words('stewards.health.began') },
  { id: 'seen', heading: words('stewards.health.seen') },
];

export default async function HealthPage(): Promise<ReactElement> {
  const { ctx } = await enter('health.read', '/stewards/health');
  const found = await readServiceState(ctx);
  if (!found.ok) notFound();
  const { workers } = found.value;
  return (
    <DeskFrame title={words('stewards.health.title')} path="/stewards/health">
      <div className="mt-6 max-w-text">
        <Parts state={found.value} />
        <p className="mt-4">
          <a href="/stewards/health">{words('stewards.health.again')}</a>
        </p>
      </div>
      <div className="mt-12">
        {workers.length === 0 ? (
          <p>{words('stewards.health.noWorkers')}</p>
        ) : (
          <DataTable
            id="workers"
            caption={words('stewards.health.workers')}
            columns={COLUMNS}
            rows={workers.map(({ id, beganAt, seenAt }) => ({
              id,
              cells: { worker: <span className="break-all">{id}</span>, began: <Instant at={beganAt} />, seen: <Instant at={seenAt} /> },
            }))}
          />
        )}
      </div>
      <p className="mt-8">{words.rich('stewards.health.outside', { link: (said) => <a href="/api/health">{said}</a> })}</p>
    </DeskFrame>
  );
}

function Parts({ state: { health, mails, jobs, version } }: { readonly state: ServiceState }): ReactElement {
  const { database, worker, mail, store } = health;
  return (
    <DefinitionList
      entries={[
        { id: 'database', name: words('stewards.health.database'), value: words(`stewards.health.is.database.${database}`) },
        { id: 'worker', name: words('stewards.health.worker'), value: words(`stewards.health.is.worker.${worker}`) },
        { id: 'mail', name: words('stewards.health.mail'), value: words(`stewards.health.is.mail.${mail}`) },
        { id: 'store', name: words('stewards.health.store'), value: words(`stewards.health.is.store.${store}`) },
        {
          id: 'mails',
          name: words('stewards.health.mailCounts'),
          value: words('stewards.health.mails', mails),
          act: <a href="/stewards/outbox">{words('stewards.menu.outbox')}</a>,
        },
        { id: 'jobs', name: words('stewards.health.jobCounts'), value: words('stewards.health.jobs', jobs) },
        { id: 'version', name: words('stewards.health.version'), value: version },
      ]}
    />
  );
}
