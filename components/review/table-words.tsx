import type { ReactNode } from 'react';
import type { Column } from '@/components/ui/data-table';
import { words } from '@/lib/kernel/words';
import type { LiveWords } from './live-table';

type Sort = 'waiting' | 'region' | 'size';

/** Up to this many are counted in words that the browser already has. */
const COUNTED = 10;

const upTo = (say: (count: number) => string, more: string): readonly string[] => [
  ...Array.from({ length: COUNTED }, (_, at) => say(at + 1)),
  more,
];

/** All that the table says by itself, since a browser has no words of its own. */
export const tableWords = (): LiveWords => ({
  cameIn: upTo((count) => words('review.live.cameIn', { count }), words('review.live.many')),
  left: upTo((count) => words('review.live.left', { count }), words('review.live.leftMany')),
  away: words('review.live.away'),
  gone: words('review.table.gone'),
});

/** Columns, some of which lead to the table sorted by them. */
export function tableColumns(sorted: Sort, addressOf: (sort: Sort) => string): readonly Column[] {
  const head = (id: string, label: string, sort: Sort, direction: 'ascending' | 'descending'): Column => ({
    id,
    label,
    heading: sortLink(label, addressOf(sort)),
    sort: sorted === sort ? direction : 'none',
  });
  return [
    head('place', words('review.table.place'), 'region', 'ascending'),
    { id: 'summary', heading: words('review.table.summary') },
    head('waits', words('review.table.waits'), 'waiting', 'descending'),
    head('size', words('review.table.size'), 'size', 'descending'),
    { id: 'state', heading: words('review.table.state') },
    { id: 'open', heading: words('review.table.open') },
  ];
}

const sortLink = (label: string, href: string): ReactNode => (
  <a href={href} aria-label={words('review.table.sortBy', { by: label })}>
    {label}
  </a>
);
