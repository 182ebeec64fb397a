import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { EntryForm, type EntryState } from '@/components/accounts/entry-form';
import { ReviewFrame } from '@/components/review/review-frame';
import { Over } from '@/components/review/review-notes';
import { Panel } from '@/components/ui/panel';
import { words } from '@/lib/kernel/words';
import { isWaiting } from '@/lib/regions/domain/amendment';
import type { Review } from '@/lib/regions/domain/amendment-view';
import { freshForm } from '@/lib/server/define-action';
import { findKept } from '@/lib/server/kept-form';
import { findToDecide, pageOf } from './find-review';

type Asked = { readonly params: Promise<{ readonly id: string }>; readonly searchParams: Promise<Query> };
type Plan = {
  /** Last part of the page's address. */
  readonly page: 'send-back' | 'hold';
  /** Its words. */
  readonly act: 'sendBack' | 'hold';
  readonly action: (prev: EntryState, form: FormData) => Promise<EntryState>;
};

/** A decision that needs a reason. What somebody typed stays, also when another was faster. */
export async function reasonPage({ params, searchParams }: Asked, { page, act, action }: Plan): Promise<ReactElement> {
  const { review } = await findToDecide((await params).id, page);
  const { amendment, name } = review;
  const kept = await findKept(one(await searchParams, 'look'));
  return (
    <ReviewFrame title={words(`review.${act}.title`, { name })} back={{ href: pageOf(amendment.id), text: words('review.page.backTo') }}>
      <div className="mt-4 max-w-text">
        <p className="mb-6">
          {words(`review.${act}.lead`)} {act === 'sendBack' ? words('review.sendBack.open', { count: openRemarks(review) }) : ''}
        </p>
        {isWaiting(amendment.state) || kept !== null ? (
          <EntryForm
            action={action}
            first={kept ?? freshForm()}
            {...formWords()}
            hidden={{ id: amendment.id, version: String(amendment.version) }}
            submit={words(`review.${act}.submit`)}
            fields={[{ name: 'reason', type: 'long-text', label: words(`review.${act}.reason`), hint: words(`review.${act}.hint`) }]}
          />
        ) : (
          <Panel>
            <p>
              <Over review={review} />
            </p>
          </Panel>
        )}
      </div>
    </ReviewFrame>
  );
}

const openRemarks = ({ remarks }: Review): number => remarks.filter(({ isAnswered }) => !isAnswered).length;
