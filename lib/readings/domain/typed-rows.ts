import type { Result } from '@/lib/kernel/result';
import { COLUMNS, readRow, type Cells, type Refused, type SheetRow } from './row-words';
import type { SheetFields } from './sheet-id';

/** First pieces and further pieces: two tables of the same shape. */
export const ROW_LISTS = ['readings', 'further'] as const;
export type RowList = (typeof ROW_LISTS)[number];

/** Rows a table shows at first, and how many each "more rows" adds. */
export const ROWS_SHOWN = 6;
export const MOST_TYPED_ROWS = 60;

/** Name of the field of one cell: "readings.value.3". */
export const cellField = (list: RowList, column: string, row: number): string => `${list}.${column}.${String(row)}`;

/** Name of the field that counts a table's rows, and of the act that adds to them. */
export const countField = (list: RowList): string => `${list}.rows`;
export const moreAct = (list: RowList): string => `more-${list}`;

export const firstOf = (fields: SheetFields, name: string): string => fields[name]?.[0] ?? '';

/** How many rows to draw: as many as before, more where that was asked for. */
export function rowCount(fields: SheetFields, list: RowList): number {
  const typed = firstOf(fields, countField(list));
  const before = /^\d{1,2}$/.test(typed) ? Number(typed) : ROWS_SHOWN;
  const more = firstOf(fields, 'act') === moreAct(list) ? ROWS_SHOWN : 0;
  return Math.min(MOST_TYPED_ROWS, Math.max(ROWS_SHOWN, before + more));
}

export type TypedRow = { readonly row: number; readonly read: Result<SheetRow, Refused> };

/** The rows of a table that hold a figure, or say that there is one below detection. Others are rows nobody filled in. */
export function typedRows(fields: SheetFields, list: RowList): readonly TypedRow[] {
  const rows = Array.from({ length: rowCount(fields, list) }, (_, place) => place + 1);
  return rows.flatMap((row) => {
    const cells: Cells = Object.fromEntries(COLUMNS.map((column) => [column, firstOf(fields, cellField(list, column, row))]));
    const filled = (cells.value ?? '').trim() !== '' || (cells.below ?? '') !== '';
    return filled ? [{ row, read: readRow(cells) }] : [];
  });
}
