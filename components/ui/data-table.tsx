import type { ReactElement, ReactNode } from 'react';

export type Column = {
  readonly id: string;
  readonly heading: ReactNode;
  /** The heading in front of a cell, where the heading itself is a link: that belongs in the head alone. */
  readonly label?: string;
  readonly numeric?: true;
  /** Where rows can be sorted by it: whether they are now, and how. */
  readonly sort?: 'ascending' | 'descending' | 'none';
};
/** `cells` by the ids of the columns; the first column is the row's header. */
export type Row = { readonly id: string; readonly cells: Readonly<Record<string, ReactNode>>; readonly lang?: string };

type Props = {
  readonly id: string;
  readonly caption: ReactNode;
  readonly columns: readonly Column[];
  readonly rows: readonly Row[];
};

/** More columns than fit side by side on paper. */
const MANY = 4;

/**
 * A table that becomes a list of labelled blocks under 40 rem. Its roles are written out, since browsers drop them
 * with `display: block`; the labels in the blocks are for the eye only, as the headers are still read.
 */
export function DataTable({ id, caption, columns, rows }: Props): ReactElement {
  return (
    <div className="scroll-area" role="region" aria-labelledby={`${id}-caption`} tabIndex={0}>
      <table className={columns.length > MANY ? 'data-table data-table-wide' : 'data-table'} role="table" aria-labelledby={`${id}-caption`}>
        <caption id={`${id}-caption`}>{caption}</caption>
        <thead role="rowgroup">
          <tr role="row">
            {columns.map((column) => (
              <th
                key={column.id}
                role="columnheader"
                scope="col"
                aria-sort={column.sort}
                className={column.numeric === true ? 'numeric' : undefined}
              >
                {column.heading}
              </th>
            ))}
          </tr>
        </thead>
        <tbody role="rowgroup">
          {rows.map((row) => (
            <tr key={row.id} role="row">
              {columns.map((column, place) => (
                <Cell key={column.id} column={column} heads={place === 0}>
                  {row.cells[column.id]}
                </Cell>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

type CellProps = { readonly column: Column; readonly heads: boolean; readonly children: ReactNode };

function Cell({ column, heads, children }: CellProps): ReactElement {
  const className = column.numeric === true ? 'numeric' : undefined;
  if (heads) {
    return (
      <th role="rowheader" scope="row" className={className}>
        {children}
      </th>
    );
  }
  return (
    <td role="cell" className={className}>
      <span className="cell-label" aria-hidden="true">
        {column.label ?? column.heading}:{' '}
      </span>
      {children}
    </td>
  );
}
