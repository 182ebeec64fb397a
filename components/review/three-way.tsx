import type { ReactElement } from 'react';
import { Badge } from '@/components/ui/badge';
import { DataTable, type Column } from '@/components/ui/data-table';
import { words } from '@/lib/kernel/words';
import type { Stale } from '@/lib/regions/domain/amendment-view';

const COLUMNS: readonly Column[] = (['item', 'field', 'was', 'now', 'mine'] as const).map((id) => ({
  id,
  heading: words(`review.stale.${id}`),
}));

/** As it was, as it now stands, as proposed: field by field. */
export function ThreeWay({ stale: { from, to, rows } }: { readonly stale: Stale }): ReactElement {
  return (
    <>
      <p className="mt-2 max-w-text">{words('review.stale.lead', { from: from ?? 0, to: to ?? 0 })}</p>
      <div className="mt-4">
        {rows.length === 0 ? (
          <p>{words('review.stale.none')}</p>
        ) : (
          <DataTable
            id="three-way"
            caption={words('review.stale.caption')}
            columns={COLUMNS}
            rows={rows.map(({ item, title, field, was, now, mine, collides }) => ({
              id: `${item} ${field}`,
              cells: {
                item: title,
                field: (
                  <>
                    {field} {collides ? <Badge colour="copper">{words('review.stale.collides')}</Badge> : null}
                  </>
                ),
                was: <Side said={was} />,
                now: <Side said={now} />,
                mine: <Side said={mine} />,
              },
            }))}
          />
        )}
      </div>
    </>
  );
}

function Side({ said }: { readonly said: string | null }): ReactElement {
  if (said === null) return <span className="text-umber">{words('review.stale.absent')}</span>;
  return <span className="whitespace-pre-line wrap-anywhere">{said}</span>;
}
