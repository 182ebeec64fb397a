import type { ShownRow, ShownTable } from './waiting-words';

/** A row on the screen. `isGone`: it waits no longer, and stands there only while it has the focus. */
export type LiveRow = ShownRow & { readonly isGone: boolean };

/** What is on the screen, and what to say of the last change. */
export type LiveTable = { readonly stamp: string; readonly count: string; readonly rows: readonly LiveRow[]; readonly said: LiveNews };
export type LiveNews = { readonly cameIn: number; readonly left: number };

const NO_NEWS: LiveNews = { cameIn: 0, left: 0 };

export const liveTable = ({ stamp, count, rows }: ShownTable): LiveTable => ({
  stamp,
  count,
  rows: rows.map((row) => ({ ...row, isGone: false })),
  said: NO_NEWS,
});

/** The table as it is to be shown next. The row that has the focus stays, also when it waits no longer, so that the focus is not lost. */
export function nextTable(shown: LiveTable, next: ShownTable, focused: string | null): LiveTable {
  if (shown.stamp === next.stamp) return shown;
  const known = new Set(shown.rows.flatMap(({ id, isGone }) => (isGone ? [] : [id])));
  const there = new Set(next.rows.map(({ id }) => id));
  const rows = next.rows.map((row) => ({ ...row, isGone: false }));
  const at = shown.rows.findIndex(({ id }) => id === focused && !there.has(id));
  const kept = shown.rows[at];
  const news = {
    cameIn: next.rows.filter(({ id }) => !known.has(id)).length,
    left: [...known].filter((id) => !there.has(id)).length,
  };
  return {
    stamp: next.stamp,
    count: next.count,
    rows: kept === undefined ? rows : rows.toSpliced(at, 0, { ...kept, isGone: true }),
    said: news,
  };
}
