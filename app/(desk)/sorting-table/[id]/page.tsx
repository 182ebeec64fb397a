import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { findSheet } from '@/app/(public)/regions/[code]/find-sheet';
import { Press } from '@/components/accounts/press';
import { namesOfLines } from '@/components/review/anchors';
import { ReviewBody } from '@/components/review/review-body';
import { ReviewFrame } from '@/components/review/review-frame';
import { ReviewHead, type LineOf } from '@/components/review/review-head';
import { ReviewNotes } from '@/components/review/review-notes';
import { Tick } from '@/components/review/tick';
import { Panel } from '@/components/ui/panel';
import { words } from '@/lib/kernel/words';
import { isWaiting } from '@/lib/regions/domain/amendment';
import type { ClaimToRead, Review } from '@/lib/regions/domain/amendment-view';
import { placeWords } from '@/lib/regions/domain/condition-words';
import { freshForm, type FormState } from '@/lib/server/define-action';
import { findKept } from '@/lib/server/kept-form';
import { answer, giveBack, mark, release, remark, tick } from '../actions';
import { findReview } from '../find-review';

type Props = { readonly params: Promise<{ readonly id: string }>; readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('review.page.heading'), robots: { index: false } };

export default async function ReviewPage({ params, searchParams }: Props): Promise<ReactElement> {
  const { ctx, review } = await findReview((await params).id);
  const query = await searchParams;
  const kept = await findKept(one(query, 'look'));
  const names = namesOfLines(review.comparison.items, review.claims);
  const mayDecide = !review.isOwn && isWaiting(review.amendment.state);
  return (
    <ReviewFrame
      title={words('review.page.title', { name: review.name })}
      back={{ href: '/sorting-table', text: words('review.page.back') }}
    >
      {one(query, 'why') === undefined ? null : <NotKept />}
      <ReviewHead review={review} line={await lineOf(review)} now={ctx.now} />
      <ReviewNotes review={review} names={names} />
      <ReviewBody review={review} names={names} {...(mayDecide ? waysToAct(review, query, kept) : READ_ONLY)} />
    </ReviewFrame>
  );
}

type Ways = Pick<Parameters<typeof ReviewBody>[0], 'acts' | 'tick' | 'giveBack' | 'release'>;

/** For whoever wrote it, and for what is decided. */
const READ_ONLY: Ways = { acts: null, tick: null, giveBack: null, release: null };

function waysToAct(review: Review, query: Query, kept: FormState | null): Ways {
  const first = kept ?? freshForm();
  return {
    acts: remarkActs(review, query, kept),
    tick: (claim) => <ClaimTick review={review} claim={claim} />,
    giveBack: <GiveBack review={review} first={first} />,
    release: <Release review={review} first={first} />,
  };
}

/** Without script what was refused here is told on the page itself. */
function NotKept(): ReactElement {
  return (
    <div className="mt-4 max-w-text" role="alert">
      <Panel colour="copper">
        <p>{words('review.fault.not-kept')}</p>
      </Panel>
    </div>
  );
}

/** The layers the place is read from today; none for a place that has no sheet. */
async function lineOf({ amendment: { region } }: Review): Promise<LineOf> {
  const sheet = await findSheet(region);
  if (sheet === null) return [];
  const names = new Map([sheet, ...sheet.above].map(({ code, name }) => [code, name]));
  return sheet.line.map((code) => ({ code, name: names.get(code) ?? placeWords(code) }));
}

function remarkActs({ amendment }: Review, query: Query, kept: FormState | null): Ways['acts'] {
  const isAbout = (about: string): boolean => [kept?.values['remark'], kept?.values['remark'] ?? kept?.values['line']].includes(about);
  const line = one(query, 'at') ?? kept?.values['line'];
  return {
    amendment: amendment.id,
    busy: formWords().busy,
    add: remark,
    answer,
    mark,
    first: (about) => (kept !== null && isAbout(about) ? kept : freshForm()),
    atLine: typeof line === 'string' ? line : null,
    isKept: one(query, 'kept') === 'yes',
  };
}

function ClaimTick({ review: { amendment, name }, claim }: { readonly review: Review; readonly claim: ClaimToRead }): ReactElement {
  const { key, isRead, title, source } = claim;
  return (
    <Tick
      key={`${key} ${String(amendment.version)}`}
      action={tick}
      first={{ key: freshForm().key, isRead, fault: null }}
      hidden={{ id: amendment.id, version: String(amendment.version), claim: key }}
      label={words('review.claims.tick')}
      about={words('review.claims.tickOf', { title: source.title, place: title === '' ? name : title })}
    />
  );
}

type PressProps = { readonly review: Review; readonly first: FormState };

function Release({ review: { amendment }, first }: PressProps): ReactElement {
  return (
    <Press
      action={release}
      first={first}
      hidden={{ id: amendment.id, version: String(amendment.version) }}
      submit={words('review.decide.release')}
      busy={formWords().busy}
    />
  );
}

function GiveBack({ review: { amendment }, first }: PressProps): ReactElement {
  return (
    <div className="mt-6 max-w-text">
      <p className="mb-3">{words('review.stale.giveBackLead')}</p>
      <Press
        action={giveBack}
        first={first}
        hidden={{ id: amendment.id, version: String(amendment.version) }}
        submit={words('review.stale.giveBack')}
        busy={formWords().busy}
        kind="primary"
      />
    </div>
  );
}
