import type { ReactElement } from 'react';
import { DataTable, type Row } from '@/components/ui/data-table';
import type { TrialComparison } from '@/lib/checks/domain/trial-comparison';
import { words } from '@/lib/kernel/words';
import type { ComparedNames } from '@/lib/regions/domain/compared-editions';
import { RuleLink } from './field-words';
import { statusWords, type Sides } from './rule-meaning';

type Props = { readonly trials: TrialComparison; readonly names: ComparedNames; readonly sides: Sides };

/** How many trial pieces come out as before, and each line of those that do not. */
export function TrialChanges({ trials: { total, unchanged, unread, changed }, names, sides }: Props): ReactElement {
  return (
    <section className="mt-8" aria-labelledby="changed-trials-run">
      <h2 id="changed-trials-run">{words('editions.trials.title')}</h2>
      <p className="mt-2 max-w-text">
        {total === 0
          ? words(sides === 'editions' ? 'editions.trials.none' : 'editions.trials.noneAmendment')
          : `${words(sides === 'editions' ? 'editions.trials.lead' : 'editions.trials.leadAmendment')} ${words('editions.trials.count', { unchanged, total })}`}
        {unread === 0 ? null : ` ${words('editions.trials.unread', { count: unread })}`}
      </p>
      {changed.length === 0 ? null : (
        <div className="mt-3">
          <DataTable
            id="trials-otherwise"
            caption={words('editions.trials.caption')}
            columns={[
              { id: 'piece', heading: words('editions.trials.piece') },
              { id: 'rule', heading: words('editions.trials.rule') },
              { id: 'before', heading: words(`editions.head.${sides === 'editions' ? 'before' : 'now'}`) },
              { id: 'after', heading: words(`editions.head.${sides === 'editions' ? 'after' : 'proposed'}`) },
            ]}
            rows={changed.flatMap(({ id, title, lines }) =>
              lines.map(({ rule, before, after }): Row => ({
                id: `${id}-${rule}`,
                cells: {
                  piece: title,
                  rule: <RuleLink id={rule} names={names} />,
                  before: statusWords(before),
                  after: statusWords(after),
                },
              })),
            )}
          />
        </div>
      )}
    </section>
  );
}
