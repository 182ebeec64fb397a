'use client';

import { useLayoutEffect, useRef, useState, type ReactElement, type ReactNode } from 'react';
import useSWR from 'swr';
import { DataTable, type Column } from '@/components/ui/data-table';
import { liveTable, nextTable, type LiveNews, type LiveRow } from './live-rows';
import type { ShownTable } from './waiting-words';

/** Words by count, from one on; the last is for more. */
type ByCount = readonly string[];

export type LiveWords = {
  readonly cameIn: ByCount;
  readonly left: ByCount;
  readonly away: string;
  readonly gone: string;
};

type Props = {
  readonly first: ShownTable;
  /** Where the same table is read as JSON: an address with a query. */
  readonly address: string;
  readonly columns: readonly Column[];
  readonly said: LiveWords;
  /** Stands there while nothing waits. */
  readonly children: ReactNode;
};

const EVERY_MS = 15_000;

/** The table of now; the one that is known where its stamp still holds. */
async function fetchTable(address: string, known: ShownTable): Promise<ShownTable> {
  const answer = await fetch(`${address}&stamp=${known.stamp}`);
  if (answer.status === 204) return known;
  if (!answer.ok) throw new Error(`The sorting table answers ${String(answer.status)}`);
  const table: unknown = await answer.json();
  if (!isTable(table)) throw new Error(`${address} is no table`);
  return table;
}

// Our own site's answer, of one release or the next: enough to know whether it is a table at all.
const isTable = (value: unknown): value is ShownTable =>
  typeof value === 'object' && value !== null && 'stamp' in value && 'count' in value && 'rows' in value && Array.isArray(value.rows);

type Held = { readonly id: string; readonly top: number };

/** The row that has the focus, or else the first one in sight: what stays where it is while rows come and go. */
function holdRow(area: HTMLElement | null): Held | null {
  const links = [...(area?.querySelectorAll<HTMLElement>('a[data-row]') ?? [])];
  const focused = links.find((link) => link === document.activeElement);
  const held = focused ?? links.find((link) => link.getBoundingClientRect().bottom > 0);
  return held === undefined ? null : { id: held.dataset['row'] ?? '', top: held.getBoundingClientRect().top };
}

/** The sorting table, which is brought up to date by itself: rows come and go without moving what one reads or the focus. */
export function LiveSortingTable({ first, address, columns, said, children }: Props): ReactElement {
  const [table, setTable] = useState(() => liveTable(first));
  const area = useRef<HTMLDivElement>(null);
  const held = useRef<Held | null>(null);
  const known = useRef(first);
  const { error } = useSWR<ShownTable, Error>(address, (asked: string) => fetchTable(asked, known.current), {
    fallbackData: first,
    revalidateOnMount: false,
    refreshInterval: EVERY_MS,
    onSuccess: (next) => {
      known.current = next;
      held.current = holdRow(area.current);
      const focused = document.activeElement instanceof HTMLElement ? (document.activeElement.dataset['row'] ?? null) : null;
      setTable((shown) => nextTable(shown, next, focused));
    },
  });
  useLayoutEffect(() => {
    const { current } = held;
    held.current = null;
    const link = current === null ? null : area.current?.querySelector(`a[data-row="${CSS.escape(current.id)}"]`);
    if (current === null || link === null || link === undefined) return;
    const moved = link.getBoundingClientRect().top - current.top;
    if (moved !== 0) window.scrollBy(0, moved);
  }, [table]);
  return (
    <div ref={area} className="sorting-table">
      <p role="status" className="font-sans text-plain text-umber">
        {error === undefined ? newsWords(table.said, said) : said.away}
      </p>
      {table.rows.length === 0 ? (
        children
      ) : (
        <DataTable
          id="waiting"
          caption={table.count}
          columns={columns}
          rows={table.rows.map((row) => ({ id: row.id, cells: cellsOf(row, said) }))}
        />
      )}
    </div>
  );
}

const byCount = (says: ByCount, count: number): string => says[Math.min(count, says.length) - 1] ?? '';

/** What came and what went; that somebody has opened one is no news to be read out. */
const newsWords = ({ cameIn, left }: LiveNews, said: LiveWords): string =>
  [byCount(said.cameIn, cameIn), byCount(said.left, left)].filter((words) => words !== '').join('. ');

function cellsOf(row: LiveRow, said: LiveWords): Readonly<Record<string, ReactNode>> {
  const { id, place, label, summary, waits, sentAt, size, minds, state, open, isGone } = row;
  return {
    place: (
      <a href={`/sorting-table/${id}`} data-row={id} aria-label={label}>
        {place}
      </a>
    ),
    summary: <span className="waiting-summary">{summary}</span>,
    waits: <time dateTime={sentAt}>{waits}</time>,
    size: (
      <>
        {size}
        {minds.map((mind) => (
          <span key={mind} className="waiting-mind">
            {mind}
          </span>
        ))}
      </>
    ),
    state: isGone ? <strong className="font-strong">{said.gone}</strong> : state,
    open,
  };
}
