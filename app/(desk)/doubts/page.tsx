import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { Note } from '@/components/accounts/note';
import { Press } from '@/components/accounts/press';
import { DoubtTable } from '@/components/doubts/doubt-table';
import { PlaceSelect } from '@/components/regions/place-select';
import { Button } from '@/components/ui/button';
import { PageHeading } from '@/components/ui/page-heading';
import { words } from '@/lib/kernel/words';
import { DOUBT_STATES, type DoubtState } from '@/lib/regions/domain/doubt';
import { doubtId, doubtsQuery } from '@/lib/regions/doubt-schema';
import { listDoubts, type ListedDoubts } from '@/lib/regions/list-doubts';
import { freshForm } from '@/lib/server/define-action';
import { enter } from '@/lib/server/lead-on';
import { takeUp } from './actions';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('doubts.desk.title'), robots: { index: false } };

export default async function DoubtsPage({ searchParams }: Props): Promise<ReactElement> {
  const { ctx } = await enter('doubt.answer', '/doubts');
  const query = await searchParams;
  const asked = doubtsQuery.parse(query);
  const found = await listDoubts(ctx, asked);
  if (!found.ok) notFound();
  const { doubts, state, counts, places, next } = found.value;
  const { region } = asked;
  return (
    <>
      <Done query={query} />
      <PageHeading>{words('doubts.desk.title')}</PageHeading>
      <p className="mt-4 max-w-text">{words('doubts.desk.lead')}</p>
      <form action="/doubts" method="get" className="not-in-print mt-6 flex max-w-text flex-wrap items-end gap-3">
        <input type="hidden" name="state" value={state} />
        <PlaceSelect label={words('doubts.desk.place')} none={words('doubts.desk.anyPlace')} places={places} chosen={region} />
        <Button kind="plain">{words('doubts.desk.filter')}</Button>
      </form>
      <States state={state} counts={counts} region={region} />
      <p role="status" className="mt-4 font-sans text-plain">
        {words('doubts.desk.found', { count: counts.get(state) ?? 0 })}
      </p>
      <div className="mt-4">
        {doubts.length === 0 ? (
          <p>{words(`doubts.desk.none.${state}`)}</p>
        ) : (
          <DoubtTable doubts={doubts.map((doubt) => ({ ...doubt, isWaiting: doubt.state === 'waiting' }))} />
        )}
      </div>
      {next === null ? null : (
        <p className="mt-6">
          <a href={addressOf({ state, region, after: next })}>{words('doubts.desk.next')}</a>
        </p>
      )}
      <p className="mt-8">
        <a href="/look-again">{words('doubts.desk.lookAgain')}</a>
      </p>
    </>
  );
}

/** What was just done, and for what was put aside the way back. */
function Done({ query }: { readonly query: Query }): ReactElement | null {
  const done = (['answered', 'set-aside', 'taken-up'] as const).find((kind) => kind === one(query, 'done'));
  if (done === undefined) return null;
  const id = doubtId.safeParse(one(query, 'of'));
  return (
    <>
      <Note>{words(`doubts.desk.done.${done}`)}</Note>
      {done === 'set-aside' && id.success ? (
        <div className="mb-6">
          <Press
            action={takeUp}
            first={freshForm()}
            hidden={{ id: id.data }}
            submit={words('doubts.desk.undo')}
            busy={formWords().busy}
            kind="plain"
          />
        </div>
      ) : null}
    </>
  );
}

type StatesProps = Pick<ListedDoubts, 'state' | 'counts'> & { readonly region: string | undefined };

function States({ state, counts, region }: StatesProps): ReactElement {
  return (
    <nav aria-label={words('doubts.desk.states')} className="mt-6">
      <ul className="site-menu" role="list">
        {DOUBT_STATES.map((one) => (
          <li key={one}>
            <a href={addressOf({ state: one, region })} aria-current={one === state ? 'page' : undefined}>
              {words(`doubts.desk.state.${one}`, { count: counts.get(one) ?? 0 })}
            </a>
          </li>
        ))}
      </ul>
    </nav>
  );
}

type Address = { readonly state: DoubtState; readonly region: string | undefined; readonly after?: string };

function addressOf({ state, region, after }: Address): string {
  const query = new URLSearchParams({
    state,
    ...(region === undefined ? {} : { region }),
    ...(after === undefined ? {} : { after }),
  });
  return `/doubts?${query.toString()}`;
}
