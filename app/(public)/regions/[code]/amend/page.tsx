import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { one, type Query } from '@/app/(account)/form-words';
import { begin } from '@/app/(workshop)/bench/amendments/actions';
import { freshKey } from '@/app/(workshop)/bench/amendments/fresh-key';
import { draftPage, itemPage } from '@/app/(workshop)/bench/amendments/item-address';
import { AskToEdit } from '@/components/amend/ask-to-edit';
import { PressButton } from '@/components/amend/press-button';
import { StateBadge, type OwnRow } from '@/components/amend/own-list';
import { PageHeading } from '@/components/ui/page-heading';
import { Panel } from '@/components/ui/panel';
import { can } from '@/lib/access/domain/policy';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { LIFE } from '@/lib/regions/domain/amendment';
import { isItemKey, type ItemKey } from '@/lib/regions/domain/sheet-items';
import { listOwnAmendments } from '@/lib/regions/list-own-amendments';
import { makeActorCtx, type ActorCtx } from '@/lib/server/actor-ctx';
import { enter } from '@/lib/server/lead-on';
import { findSheet } from '../find-sheet';

type Props = { readonly params: Promise<{ readonly code: string }>; readonly searchParams: Promise<Query> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const sheet = await findSheet((await params).code);
  return sheet === null ? {} : { title: words('amend.begin.title', { name: sheet.name }), robots: { index: false } };
}

export default async function AmendPage({ params, searchParams }: Props): Promise<ReactElement> {
  const [{ code }, query] = [await params, await searchParams];
  const sheet = await findSheet(code);
  if (sheet === null) notFound();
  const ctx = await makeActorCtx();
  const heading = <PageHeading>{words('amend.begin.title', { name: sheet.name })}</PageHeading>;
  if (ctx.actor.kind === 'account' && !can(ctx.actor, 'amendment.write')) return <AskToEdit heading={heading} />;
  const item = itemIn(query);
  await enter('amendment.write', `/regions/${code}/amend${item === null ? '' : `?item=${encodeURIComponent(item)}`}`);
  return (
    <div className="max-w-text">
      {heading}
      <Refused why={one(query, 'why')} />
      <p className="mt-4">{words('amend.begin.lead')}</p>
      <Begin ctx={ctx} code={code} item={item} />
      <p className="mt-6">
        <a href={`/regions/${code}`}>{words('amend.begin.back', { name: sheet.name })}</a>
      </p>
    </div>
  );
}

/** The part of the sheet somebody came from. */
function itemIn(query: Query): ItemKey | null {
  const asked = one(query, 'item');
  return asked !== undefined && isItemKey(asked) ? asked : null;
}

function Refused({ why }: { readonly why: string | undefined }): ReactElement | null {
  if (why === undefined) return null;
  return (
    <div className="mt-4">
      <Panel colour="copper">
        <p role="alert">{words('amend.refused.other')}</p>
      </Panel>
    </div>
  );
}

type BeginProps = { readonly ctx: ActorCtx; readonly code: string; readonly item: ItemKey | null };

/** One's open drafts of this sheet, and a new one. */
async function Begin({ ctx, code, item }: BeginProps): Promise<ReactElement> {
  const own = await listOwnAmendments(ctx);
  const drafts = own.ok ? own.value.filter(({ amendment }) => amendment.region === code && LIFE.save[amendment.state] !== undefined) : [];
  return (
    <>
      <Drafts drafts={drafts} item={item} />
      <div className="mt-6">
        <PressButton
          action={begin}
          kind={drafts.length === 0 ? 'primary' : 'plain'}
          hidden={{ key: freshKey(), region: code, ...(item === null ? {} : { item }) }}
        >
          {words('amend.begin.new')}
        </PressButton>
      </div>
    </>
  );
}

function Drafts({ drafts, item }: { readonly drafts: readonly OwnRow[]; readonly item: ItemKey | null }): ReactElement | null {
  if (drafts.length === 0) return null;
  return (
    <section className="mt-6" aria-labelledby="drafts">
      <h2 id="drafts">{words('amend.begin.drafts')}</h2>
      <ul className="mt-3" role="list">
        {drafts.map(({ amendment: { id, state, changedAt }, items }) => (
          <li key={id} className="border-b border-rule py-3">
            <a href={item === null ? draftPage(id) : itemPage(id, item)}>
              {words('amend.begin.goOn', { date: sayDate(calendarDateOf(changedAt)), count: items })}
            </a>{' '}
            <StateBadge state={state} />
          </li>
        ))}
      </ul>
    </section>
  );
}
