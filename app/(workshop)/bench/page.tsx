import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { BenchNotices } from '@/components/accounts/bench-notices';
import { Note } from '@/components/accounts/note';
import { PageHeading } from '@/components/ui/page-heading';
import type { Role } from '@/lib/access/domain/actor';
import { readOwnAccount } from '@/lib/accounts/read-own-account';
import { words } from '@/lib/kernel/words';
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
        {LINKS.map(([href, name]) => (
          <li key={href} className="py-1">
            <a href={href}>{words(`bench.do.${name}`)}</a>
          </li>
        ))}
        <RoleLink role={actor.role} />
      </ul>
    </div>
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
