import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';

/** Nothing waits, or nothing of what was asked for: why, and where to look instead. */
export function TableEmpty({ isNarrowed }: { readonly isNarrowed: boolean }): ReactElement {
  return (
    <section className="mt-4 max-w-text" aria-labelledby="nothing-waits">
      <h2 id="nothing-waits">{words(isNarrowed ? 'review.empty.filteredTitle' : 'review.empty.title')}</h2>
      <p className="mt-2">{words(isNarrowed ? 'review.empty.filtered' : 'review.empty.meaning')}</p>
      <p className="mt-3">
        <a href="/day-book?kind=amendments">{words('review.empty.act')}</a>
      </p>
    </section>
  );
}
