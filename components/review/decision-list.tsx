import type { ReactElement } from 'react';
import { sayInstant } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import type { ToldDecision } from '@/lib/regions/domain/amendment-view';

/** What moderators have decided so far, each with its reason. */
export function DecisionList({ decisions }: { readonly decisions: readonly ToldDecision[] }): ReactElement {
  if (decisions.length === 0) return <p className="mt-2">{words('review.decision.none')}</p>;
  return (
    <ol className="mt-3 flex flex-col gap-4">
      {decisions.map(({ kind, by, isOwn, at, version, reason }) => (
        <li key={`${kind} ${String(version)}`}>
          <p>
            <span className="font-strong">{words(`review.decision.${kind}`, { by: isOwn ? words('review.decision.you') : by })}</span>{' '}
            {words('review.decision.at', { at: sayInstant(at), version })}
          </p>
          {reason === null ? null : <blockquote className="claim-passage whitespace-pre-line wrap-anywhere">{reason}</blockquote>}
        </li>
      ))}
    </ol>
  );
}
