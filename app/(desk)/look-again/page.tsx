import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { one, type Query } from '@/app/(account)/form-words';
import { Note } from '@/components/accounts/note';
import { DueTable } from '@/components/doubts/due-table';
import { KeeperButton } from '@/components/doubts/keeper-button';
import { LookFilter } from '@/components/doubts/look-filter';
import { saidName } from '@/components/doubts/said-name';
import { Disclosure } from '@/components/ui/disclosure';
import { ErrorSummary } from '@/components/ui/error-summary';
import { PageHeading } from '@/components/ui/page-heading';
import { Panel } from '@/components/ui/panel';
import { words } from '@/lib/kernel/words';
import { lookAgainQuery, type LookAgainQuery } from '@/lib/regions/doubt-schema';
import { listLookAgain, type LookAgainList } from '@/lib/regions/list-look-again';
import { freshForm } from '@/lib/server/define-action';
import { enter } from '@/lib/server/lead-on';
import { become, stop } from './actions';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('doubts.look.title'), robots: { index: false } };

export default async function LookAgainPage({ searchParams }: Props): Promise<ReactElement> {
  const { ctx, actor } = await enter('sheet.keep', '/look-again');
  const query = await searchParams;
  const asked = lookAgainQuery.parse(query);
  const found = await listLookAgain(ctx, asked);
  if (!found.ok) notFound();
  const list = found.value;
  const typed = (one(query, 'days') ?? '').trim().slice(0, 20);
  const wrong = typed !== '' && asked.days === undefined ? words('doubts.look.daysWrong') : undefined;
  const isFiltered = [asked.region, asked.keeper, asked.days].some((value) => value !== undefined);
  return (
    <>
      {wrong === undefined ? null : (
        <ErrorSummary heading={words('doubts.look.filterFault')} faults={[{ id: 'days', said: wrong }]} tries={1} />
      )}
      <Told query={query} list={list} asked={asked} />
      <PageHeading>{words('doubts.look.title')}</PageHeading>
      <p className="mt-4 max-w-text">{words('doubts.look.lead')}</p>
      <LookFilter
        places={list.places}
        keepers={othersOf(list, actor.id)}
        region={asked.region}
        keeper={asked.keeper}
        days={typed}
        error={wrong}
      />
      {isFiltered ? (
        <p className="mt-4">
          <a href="/look-again">{words('doubts.look.all')}</a>
        </p>
      ) : null}
      <p role="status" className="mt-6 font-sans text-plain">
        {words('doubts.look.found', { count: list.count, overdue: list.overdue })}
      </p>
      <div className="mt-4">
        {list.rules.length === 0 ? (
          <p>{words('doubts.look.none', { days: list.days })}</p>
        ) : (
          <DueTable rules={list.rules} keepers={namesBySheet(list)} />
        )}
      </div>
      <Pages list={list} asked={asked} />
      <Keeping list={list} region={asked.region} />
      <p className="mt-8">
        <a href="/doubts">{words('doubts.look.doubts')}</a>
      </p>
    </>
  );
}

/** The others who keep a sheet, as far as they are named. */
const othersOf = ({ keepers }: LookAgainList, own: string): readonly { readonly accountId: string; readonly name: string }[] =>
  keepers.flatMap(({ accountId, said }) => (accountId === own || said.kind !== 'named' ? [] : [{ accountId, name: said.name }]));

function namesBySheet({ keepers }: LookAgainList): ReadonlyMap<string, readonly string[]> {
  const names = new Map<string, readonly string[]>();
  for (const { region, said } of keepers) names.set(region, [...(names.get(region) ?? []), saidName(said)]);
  return names;
}

type ListProps = { readonly list: LookAgainList; readonly asked: LookAgainQuery };

/** What a press of a button did. */
function Told({ query, list, asked }: ListProps & { readonly query: Query }): ReactElement | null {
  const done = (['took', 'gave'] as const).find((kind) => kind === one(query, 'done'));
  const place = list.places.find(({ code }) => code === asked.region)?.name;
  if (done !== undefined && place !== undefined) return <Note>{words(`doubts.keepers.done.${done}`, { place })}</Note>;
  if (one(query, 'why') !== 'refused') return null;
  return (
    <div role="alert" className="mb-6">
      <Panel colour="copper">
        <p>{words('doubts.keepers.refused')}</p>
      </Panel>
    </div>
  );
}

function Pages({ list: { page, pages }, asked }: ListProps): ReactElement | null {
  if (pages === 1) return null;
  return (
    <nav aria-label={words('doubts.look.pages')} className="mt-6 flex flex-wrap gap-4">
      {page === 1 ? null : <a href={addressOf(asked, page - 1)}>{words('doubts.look.before')}</a>}
      <span>{words('doubts.look.page', { page, pages })}</span>
      {page === pages ? null : <a href={addressOf(asked, page + 1)}>{words('doubts.look.after')}</a>}
    </nav>
  );
}

function addressOf({ region, keeper, days }: LookAgainQuery, page: number): string {
  const query = new URLSearchParams({
    ...(region === undefined ? {} : { region }),
    ...(keeper === undefined ? {} : { keeper }),
    ...(days === undefined ? {} : { days: String(days) }),
    page: String(page),
  });
  return `/look-again?${query.toString()}`;
}

type KeepingProps = { readonly list: LookAgainList; readonly region: string | undefined };

/** The sheets one may keep: the one asked for, or all of them folded. */
function Keeping({ list, region }: KeepingProps): ReactElement {
  const names = namesBySheet(list);
  const shown = list.places.filter(({ code }) => region === undefined || code === region);
  return (
    <section className="not-in-print mt-12 max-w-text">
      <Disclosure summary={words('doubts.look.keeping')} open={region !== undefined}>
        <p className="mb-4">{words('doubts.look.keepingLead')}</p>
        <ul role="list">
          {shown.map((place) => (
            <li key={place.code} className="flex flex-wrap items-center justify-between gap-3 border-b border-rule py-2">
              <span>
                <a href={`/regions/${place.code}`}>{place.name}</a>
                {': '}
                {(names.get(place.code) ?? []).join(', ') || words('doubts.look.nobodyKeeps')}
              </span>
              <KeeperButton
                place={place}
                isKept={list.own.includes(place.code)}
                formKey={freshForm().key}
                back="list"
                become={become}
                stop={stop}
              />
            </li>
          ))}
        </ul>
      </Disclosure>
    </section>
  );
}
