import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { DataTable } from '@/components/ui/data-table';
import { controlProps, Field } from '@/components/ui/field';
import { words } from '@/lib/kernel/words';
import { saySubstance, sayUnitName } from './figure-words';
import {
  COLUMNS,
  readPart,
  readSubstance,
  readUnit,
  SHEET_PARTS,
  SHEET_UNITS,
  SUBSTANCES,
  type RowColumn,
} from '@/lib/readings/domain/row-words';
import { pastedField } from '@/lib/readings/domain/sheet-entry';
import { cellField, countField, firstOf, moreAct, MOST_TYPED_ROWS, rowCount, type RowList } from '@/lib/readings/domain/typed-rows';
import { CellBox, CellInput, CellSelect } from './cell-input';
import { errorAt, type FormView } from './form-view';

type Props = { readonly list: RowList; readonly view: FormView };

/** A table of figures to type, and a field to paste them into. */
export function RowTable({ list, view }: Props): ReactElement {
  const count = rowCount(view.fields, list);
  const rows = Array.from({ length: count }, (_, place) => place + 1);
  return (
    <>
      <input type="hidden" name={countField(list)} value={count} />
      <DataTable
        id={list}
        caption={words(`readings-page.rows.caption.${list}`)}
        columns={[
          { id: 'row', heading: words('readings-page.rows.row') },
          ...COLUMNS.map((column) => ({ id: column, heading: words(`readings-page.rows.column.${column}`) })),
        ]}
        rows={rows.map((row) => ({
          id: String(row),
          cells: {
            row,
            ...Object.fromEntries(
              COLUMNS.map((column) => [column, <Cell key={column} list={list} view={view} column={column} row={row} />]),
            ),
          },
        }))}
      />
      {count >= MOST_TYPED_ROWS ? null : (
        <p className="mt-4">
          <Button kind="plain" name="act" value={moreAct(list)}>
            {words(list === 'readings' ? 'readings-page.act.more' : 'readings-page.act.moreFurther')}
          </Button>
        </p>
      )}
      <PasteField list={list} view={view} />
    </>
  );
}

function PasteField({ list, view }: Props): ReactElement {
  const id = pastedField(list);
  const said = {
    label: words(`readings-page.rows.paste.${list}`),
    hint: words('readings-page.rows.pasteHint'),
    error: errorAt(view, id),
  };
  return (
    <div className="mt-6 max-w-text">
      <Field id={id} {...said}>
        <textarea
          className="control paste-field"
          name={id}
          rows={6}
          spellCheck={false}
          autoComplete="off"
          defaultValue={firstOf(view.fields, id)}
          {...controlProps(id, said)}
        />
      </Field>
      <p className="mt-2">
        <Button kind="plain" name="act" value="preview">
          {words('readings-page.act.preview')}
        </Button>
      </p>
    </div>
  );
}

type CellProps = Props & { readonly column: RowColumn; readonly row: number };

function Cell({ list, view, column, row }: CellProps): ReactElement {
  const field = cellField(list, column, row);
  const typed = firstOf(view.fields, field);
  const cell = {
    field,
    label: words(`readings-page.rows.cell.${list}`, { row, column: words(`readings-page.rows.column.${column}`) }),
    error: errorAt(view, field),
  };
  const choose = words('readings-page.rows.choose');
  switch (column) {
    case 'specimen':
      return <CellInput {...cell} value={typed} />;
    case 'value':
      return <CellInput {...cell} value={typed} decimal />;
    case 'below':
      return <CellBox {...cell} value={typed} />;
    case 'part':
      return <CellSelect {...cell} value={readPart(typed) ?? 'vessel'} options={PARTS} />;
    case 'substance':
      return <CellSelect {...cell} value={readSubstance(typed) ?? ''} none={choose} options={SUBSTANCE_OPTIONS} />;
    case 'unit':
      return <CellSelect {...cell} value={readUnit(typed) ?? ''} none={choose} options={UNITS} />;
  }
}

const PARTS = SHEET_PARTS.map((value) => ({ value, label: words(`readings-page.rows.part.${value}`) }));
const SUBSTANCE_OPTIONS = SUBSTANCES.map((value) => ({ value, label: saySubstance(value) }));
const UNITS = SHEET_UNITS.map((value) => ({ value, label: sayUnitName(value) }));
