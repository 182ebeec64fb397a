import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { Press } from '@/components/accounts/press';
import { BecomesTrue, Effects } from '@/components/review/becomes-true';
import { Over } from '@/components/review/review-notes';
import { ReadSources } from '@/components/review/read-sources';
import { ReviewFrame } from '@/components/review/review-frame';
import { Panel } from '@/components/ui/panel';
import { words } from '@/lib/kernel/words';
import { isWaiting } from '@/lib/regions/domain/amendment';
import type { Review } from '@/lib/regions/domain/amendment-view';
import { freshForm, type FormState } from '@/lib/server/define-action';
import { findKept } from '@/lib/server/kept-form';
import { approve } from '../../actions';
import { findToDecide, pageOf } from '../../find-review';

type Props = { readonly params: Promise<{ readonly id: string }>; readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('review.approve.heading'), robots: { index: false } };

export default async function ApprovePage({ params, searchParams }: Props): Promise<ReactElement> {
  const { review } = await findToDecide((await params).id, 'approve');
  const { amendment, comparison, claims, name, needed, given } = review;
  if (review.stale !== null && isWaiting(amendment.state)) redirect(`${pageOf(amendment.id)}#part-stale`);
  const kept = await findKept(one(await searchParams, 'look'));
  return (
    <ReviewFrame title={words('review.approve.title', { name })} back={{ href: pageOf(amendment.id), text: words('review.page.backTo') }}>
      <div className="max-w-text">
        <p className="mt-4">{words('review.approve.lead')}</p>
        <h2 className="mt-8">{words('review.page.part.becomes')}</h2>
        <div className="mt-3">
          <BecomesTrue compared={comparison} />
          <Effects compared={comparison} needsSecond={needed === 2 && given === 0} />
        </div>
        <ReadSources claims={claims} page={pageOf(amendment.id)} />
        <div className="mt-8">
          <ApproveForm review={review} kept={kept} />
        </div>
      </div>
    </ReviewFrame>
  );
}

/** The button, or why there is none. A refused form stays, so that its words are read. */
function ApproveForm({ review, kept }: { readonly review: Review; readonly kept: FormState | null }): ReactElement {
  const { amendment, needed, given } = review;
  const hindrance = hindranceOf(review);
  return (
    <>
      {kept === null ? null : (
        <p className="field-error mb-4" role="alert">
          {Object.values(kept.errors).join(' ')}
        </p>
      )}
      {hindrance === null ? (
        <Press
          action={approve}
          first={{ ...freshForm(), key: kept?.key ?? freshForm().key }}
          hidden={{ id: amendment.id, version: String(amendment.version) }}
          submit={words(needed === 2 && given === 0 ? 'review.approve.submitFirst' : 'review.approve.submitLast')}
          busy={formWords().busy}
          kind="primary"
        />
      ) : (
        <Panel colour="ash">
          <p>{hindrance === 'over' ? <Over review={review} /> : words(`review.approve.${hindrance}`)}</p>
        </Panel>
      )}
    </>
  );
}

function hindranceOf({ amendment, gaveIt, findings, claims }: Review): 'over' | 'held' | 'gaveIt' | 'errors' | 'unreadLead' | null {
  if (!isWaiting(amendment.state)) return 'over';
  if (amendment.state === 'held') return 'held';
  if (gaveIt) return 'gaveIt';
  if (findings.some(({ level }) => level === 'error')) return 'errors';
  return claims.every(({ isRead }) => isRead) ? null : 'unreadLead';
}
