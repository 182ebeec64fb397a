import type { ReactElement } from 'react';
import { DataTable } from '@/components/ui/data-table';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';

type Asked = { readonly id: string; readonly name: string; readonly madeAt: Date; readonly places: readonly string[] };

const COLUMNS = [
  { id: 'name', heading: words('stewards.requests.name') },
  { id: 'since', heading: words('stewards.requests.since') },
  { id: 'places', heading: words('stewards.requests.places') },
  { id: 'read', heading: words('stewards.outbox.act') },
];

/** Makers who wait for an answer. */
export function RequestTable({ requests }: { readonly requests: readonly Asked[] }): ReactElement {
  if (requests.length === 0) return <p>{words('stewards.requests.none')}</p>;
  return (
    <DataTable
      id="requests"
      caption={words('stewards.requests.caption')}
      columns={COLUMNS}
      rows={requests.map(({ id, name, madeAt, places }) => ({
        id,
        cells: {
          name,
          since: sayDate(calendarDateOf(madeAt)),
          places: places.length === 0 ? words('stewards.requests.noPlaces') : places.join(', '),
          read: (
            <a href={`/stewards/requests/${id}`} aria-label={words('stewards.requests.readOf', { name })}>
              {words('stewards.requests.read')}
            </a>
          ),
        },
      }))}
    />
  );
}
