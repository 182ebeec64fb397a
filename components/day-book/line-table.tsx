import type { ReactElement } from 'react';
import { Instant } from '@/components/stewards/instant';
import { DataTable } from '@/components/ui/data-table';
import type { ToldLine } from '@/lib/day-book/domain/told-line';
import { words } from '@/lib/kernel/words';
import { sayLine } from './line-words';

const COLUMNS = (['number', 'at', 'what', 'reason'] as const).map((id) => ({ id, heading: words(`day-book.${id}`) }));

type Props = {
  readonly lines: readonly ToldLine[];
  /** Places with a sheet: a line leads nowhere else. */
  readonly places: readonly { readonly code: string; readonly name: string }[];
};

/** Lines of the day book in words. */
export function LineTable({ lines, places }: Props): ReactElement {
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
          what: (
            <>
              {sayLine(line)} <LineLink line={line} places={places} />
            </>
          ),
          reason: <span className="whitespace-pre-line break-words">{line.reason ?? words('day-book.noReason')}</span>,
        },
      }))}
    />
  );
}

type LinkProps = Pick<Props, 'places'> & { readonly line: ToldLine };

/** From a line on a sheet to what came of it: the edition, where there is one, else the sheet as it stands. */
function LineLink({ line: { number, region, edition }, places }: LinkProps): ReactElement | null {
  const place = places.find(({ code }) => code === region);
  if (place === undefined) return null;
  const href = edition === null ? `/regions/${place.code}` : `/regions/${place.code}/editions/${String(edition)}`;
  const said = edition === null ? words('day-book.toSheet') : words('day-book.toEdition', { edition });
  return (
    <a href={href} aria-label={words('day-book.toOf', { said, name: place.name, number })}>
      {said}
    </a>
  );
}
