import type { ReactElement, ReactNode } from 'react';
import { LinkButton } from '@/components/ui/link-button';
import { words } from '@/lib/kernel/words';
import type { Review } from '@/lib/regions/domain/amendment-view';

type Props = {
  readonly review: Review;
  /** The form that releases what is held. */
  readonly release: ReactNode;
};

/** Not by whoever has given the first approval, not while it is held, and not over a newer edition. */
const canBeApproved = ({ amendment, gaveIt, stale }: Review): boolean => amendment.state !== 'held' && !gaveIt && stale === null;

/** The ways to a decision; each leads to a page of its own. */
export function DecidePanel({ review, release }: Props): ReactElement {
  const { amendment, claims } = review;
  const unread = claims.filter(({ isRead }) => !isRead).length;
  const isHeld = amendment.state === 'held';
  const mayApprove = canBeApproved(review);
  const to = (page: string): string => `/sorting-table/${amendment.id}/${page}`;
  return (
    <>
      <p className="mt-2 max-w-text">{words('review.decide.lead')}</p>
      {mayApprove && unread > 0 ? <p className="mt-2 max-w-text">{words('review.decide.unread', { count: unread })}</p> : null}
      <p className="mt-4 flex flex-wrap gap-4">
        {mayApprove ? <LinkButton href={to('approve')}>{words('review.decide.approve')}</LinkButton> : null}
        <LinkButton kind="plain" href={to('send-back')}>
          {words('review.decide.sendBack')}
        </LinkButton>
        {isHeld ? null : (
          <LinkButton kind="plain" href={to('hold')}>
            {words('review.decide.hold')}
          </LinkButton>
        )}
      </p>
      {isHeld ? (
        <div className="mt-6 max-w-text">
          <p className="mb-3">{words('review.decide.releaseLead')}</p>
          {release}
        </div>
      ) : null}
    </>
  );
}
