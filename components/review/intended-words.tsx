import type { ReactElement } from 'react';
import type { TrialComparison } from '@/lib/checks/domain/trial-comparison';
import { words } from '@/lib/kernel/words';
import type { Amendment } from '@/lib/regions/domain/amendment';

type Props = { readonly changed: TrialComparison['changed']; readonly intended: Amendment['intended'] };

/** Why each trial piece that comes out otherwise is meant to. */
export function IntendedWords({ changed, intended }: Props): ReactElement | null {
  if (changed.length === 0) return null;
  return (
    <section className="mt-6 max-w-text" aria-labelledby="intended">
      <h3 id="intended">{words('review.intended.title')}</h3>
      <dl className="definitions mt-2">
        {changed.map(({ id, title }) => (
          <div key={id}>
            <dt>{title}</dt>
            <dd className="whitespace-pre-line wrap-anywhere">{intended[id] ?? words('review.intended.none')}</dd>
          </div>
        ))}
      </dl>
    </section>
  );
}
