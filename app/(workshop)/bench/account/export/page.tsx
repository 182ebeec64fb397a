import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { AccountFrame } from '@/components/accounts/account-frame';
import { Press } from '@/components/accounts/press';
import { LinkButton } from '@/components/ui/link-button';
import { Panel } from '@/components/ui/panel';
import type { ExportProgress } from '@/lib/accounts/domain/export';
import { readLastExport } from '@/lib/accounts/read-export';
import { sayInstant } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { freshForm } from '@/lib/server/define-action';
import { findKept } from '@/lib/server/kept-form';
import { enter } from '@/lib/server/lead-on';
import { putTogether } from '../actions';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('bench.export.title'), robots: { index: false } };

export default async function ExportPage({ searchParams }: Props): Promise<ReactElement> {
  const { ctx } = await enter('account.export', '/bench/account/export');
  const last = await readLastExport(ctx);
  const progress = last.ok && last.value !== null ? last.value.progress : null;
  return (
    <AccountFrame title={words('bench.export.title')}>
      <p className="mt-4 mb-6">{words('bench.export.lead')}</p>
      {progress === null ? null : (
        <div role="status" className="mb-6">
          <Panel>
            <Progress progress={progress} />
          </Panel>
        </div>
      )}
      <Press
        action={putTogether}
        first={(await findKept(one(await searchParams, 'look'))) ?? freshForm()}
        busy={formWords().busy}
        kind={progress === null ? 'primary' : 'plain'}
        submit={words(progress === null ? 'bench.export.submit' : 'bench.export.again')}
      />
    </AccountFrame>
  );
}

function sayProgress(progress: ExportProgress): string {
  switch (progress.state) {
    case 'waiting':
      return words('bench.export.waiting');
    case 'at-work':
      return words('bench.export.work', { done: progress.done, total: progress.total });
    case 'ready':
      return words('bench.export.ready', { until: sayInstant(progress.until) });
    case 'over':
      return words('bench.export.over');
    case 'failed':
      return words('bench.export.failed');
  }
}

function Progress({ progress }: { readonly progress: ExportProgress }): ReactElement {
  const isAtWork = progress.state === 'waiting' || progress.state === 'at-work';
  return (
    <>
      <p>{sayProgress(progress)}</p>
      {progress.state === 'ready' ? (
        <p className="mt-3">
          <LinkButton href={`/bench/account/export/${progress.archive}`}>{words('bench.export.fetch')}</LinkButton>
        </p>
      ) : null}
      {isAtWork ? (
        <p className="mt-3">
          <a href="/bench/account/export">{words('bench.export.look')}</a>
        </p>
      ) : null}
    </>
  );
}
