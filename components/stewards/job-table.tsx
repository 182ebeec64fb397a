import type { ReactElement } from 'react';
import { DataTable } from '@/components/ui/data-table';
import { words } from '@/lib/kernel/words';
import { Instant } from './instant';
import { RetryButton } from './retry-button';

type Job = {
  readonly id: string;
  readonly kind: string;
  readonly state: 'waiting' | 'running' | 'done' | 'parked';
  readonly tries: number;
  readonly done: number;
  readonly total: number;
  readonly failure: string | null;
  readonly madeAt: Date;
};

type Props = { readonly jobs: readonly Job[]; readonly keyOf: () => string; readonly retry: (form: FormData) => Promise<void> };

const COLUMNS = [
  { id: 'kind', heading: words('stewards.outbox.jobs.kind') },
  { id: 'state', heading: words('stewards.outbox.jobs.state') },
  { id: 'progress', heading: words('stewards.outbox.jobs.progress') },
  { id: 'made', heading: words('stewards.outbox.made') },
  { id: 'failure', heading: words('stewards.outbox.jobs.failure') },
  { id: 'act', heading: words('stewards.outbox.act') },
];

/** Work in the background that is not done, with how far it is. */
export function JobTable({ jobs, keyOf, retry }: Props): ReactElement {
  if (jobs.length === 0) return <p>{words('stewards.outbox.jobs.none')}</p>;
  return (
    <DataTable
      id="jobs"
      caption={words('stewards.outbox.jobs.caption')}
      columns={COLUMNS}
      rows={jobs.map(({ id, kind, state, done, total, failure, madeAt }) => ({
        id,
        cells: {
          kind,
          state: words(`stewards.outbox.jobs.states.${state}`),
          progress: total === 0 ? words('stewards.outbox.jobs.notYet') : words('stewards.outbox.jobs.of', { done, total }),
          made: <Instant at={madeAt} />,
          failure: failure ?? words('stewards.outbox.jobs.noFailure'),
          act:
            state === 'parked' ? (
              <RetryButton what="job" id={id} formKey={keyOf()} label={words('stewards.outbox.retryJob', { kind })} act={retry} />
            ) : null,
        },
      }))}
    />
  );
}
