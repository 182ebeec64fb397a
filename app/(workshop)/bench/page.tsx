import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { BenchNotices } from '@/components/accounts/bench-notices';
import { Note } from '@/components/accounts/note';
import { PageHeading } from '@/components/ui/page-heading';
import type { Role } from '@/lib/access/domain/actor';
import { can } from '@/lib/access/domain/policy';
import { readOwnAccount } from '@/lib/accounts/read-own-account';
import { words } from '@/lib/kernel/words';
import { listWaiting } from '@/lib/regions/list-waiting';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { freshForm } from '@/lib/server/define-action';
import { doorOf, enter } from '@/lib/server/lead-on';
import { confirmAgain, stay } from './actions';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('bench.title'), robots: { index: false } };

const LINKS = [
  ['/check', 'check'],
  ['/readings', 'readings'],
  ['/regions', 'regions'],
  ['/bench/account', 'account'],
] as const;

/** What editors, and those above them, look after. */
const EDITOR_LINKS = [
  ['/bench/amendments', 'amendments'],
  ['/doubts', 'doubts'],
  ['/look-again', 'lookAgain'],
] as const;

export default async function BenchPage({ searchParams }: Props): Promise<ReactElement> {
  const { ctx, actor } = await enter('account.read-own', '/bench');
  const done = one(await searchParams, 'done');
  const own = await readOwnAccount(ctx);
  if (!own.ok) redirect(doorOf(own.error.kind, '/bench') ?? '/');
  return (
    <div className="max-w-text">
      {done === 'sent' ? <Note>{words('bench.confirm.sent')}</Note> : null}
      {done === 'kept' ? <Note>{words('bench.leaving.kept')}</Note> : null}
      <PageHeading>{words('bench.greeting', { name: actor.name })}</PageHeading>
      <BenchNotices
        account={own.value.account}
        wantsFactor={(actor.role === 'moderator' || actor.role === 'steward') && actor.secondFactor === 'off'}
        confirmAgain={confirmAgain}
        stay={stay}
        first={freshForm()}
        busy={formWords().busy}
      />
      <p className="mt-6">
        <strong className="font-strong">{words('bench.role.label')}:</strong> {words(`bench.role.${actor.role}`)}
      </p>
      <h2 className="mt-8">{words('bench.do.title')}</h2>
      <ul className="mt-3" role="list">
        {[...LINKS, ...(can(actor, 'doubt.answer') ? EDITOR_LINKS : [])].map(([href, name]) => (
          <li key={href} className="py-1">
            <a href={href}>{words(`bench.do.${name}`)}</a>
          </li>
        ))}
        <TableLink waiting={await countWaiting(ctx)} />
        <RoleLink role={actor.role} />
      </ul>
    </div>
  );
}

/** How many amendments wait for a moderator: `unknown` before the second step is given, null for whoever is none. */
async function countWaiting(ctx: ActorCtx): Promise<number | 'unknown' | null> {
  if (!can(ctx.actor, 'amendment.judge')) return null;
  const waiting = await listWaiting(ctx, {});
  return waiting.ok ? waiting.value.length : 'unknown';
}

function TableLink({ waiting }: { readonly waiting: number | 'unknown' | null }): ReactElement | null {
  if (waiting === null) return null;
  return (
    <li className="py-1">
      <a href="/sorting-table">{waiting === 'unknown' ? words('review.link') : words('review.waiting', { count: waiting })}</a>
    </li>
  );
}

/** What one role alone has to do: ask for the next one, or run the place. */
function RoleLink({ role }: { readonly role: Role }): ReactElement | null {
  if (role !== 'maker' && role !== 'steward') return null;
  return (
    <li className="py-1">
      {role === 'maker' ? <a href="/bench/ask">{words('bench.do.ask')}</a> : <a href="/stewards">{words('stewards.title')}</a>}
    </li>
  );
}
