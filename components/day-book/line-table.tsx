import type { ReactElement } from 'react';
import { Instant } from '@/components/stewards/instant';
import { DataTable } from '@/components/ui/data-table';
import type { ToldLine } from '@/lib/day-book/domain/told-line';
import { words } from '@/lib/kernel/words';
import { sayLine } from './line-words';

const COLUMNS = (['number', 'at', 'what', 'reason'] as const).map((id) => ({ id, heading: words(`day-book.${id}`) }));

/** Lines of the day book in words. */
export function LineTable({ lines }: { readonly lines: readonly ToldLine[] }): ReactElement {
  return (
    <DataTable
      id="lines"
      caption={words('day-book.caption')}
      columns={COLUMNS}
      rows={lines.map((line) => ({
        id: String(line.number),
        cells: {
          number: <span id={`line-${line.number}`}>{line.number}</span>,
          at: <Instant at={line.at} />,
          what: sayLine(line),
          reason: <span className="whitespace-pre-line break-words">{line.reason ?? words('day-book.noReason')}</span>,
        },
      }))}
    />
  );
}
