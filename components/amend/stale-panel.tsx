import type { ReactElement } from 'react';
import { DataTable, type Row } from '@/components/ui/data-table';
import { Panel } from '@/components/ui/panel';
import { words, wordsAt } from '@/lib/kernel/words';
import type { Stale, ThreeWayRow } from '@/lib/regions/domain/amendment-view';
import { HiddenFields } from './hidden-fields';

type Props = {
  readonly stale: Stale;
  readonly carry: (form: FormData) => Promise<void>;
  readonly hidden: Readonly<Record<string, string>>;
  /** It can be carried over as it is; what waits for a moderator is taken back first. */
  readonly isOpen: boolean;
};

/** The sheet moved on: three versions side by side, field by field, and the form that carries the changes over. */
export function StalePanel({ stale, carry, hidden, isOpen }: Props): ReactElement {
  const { to, rows } = stale;
  const collisions = rows.filter(({ key }) => key !== null);
  return (
    <section className="amend-section" aria-labelledby="stale">
      <Panel colour="ash">
        <h2 id="stale">{to === null ? words('amend.stale.gone') : words('amend.stale.title', { number: to })}</h2>
        <p className="mt-2">{words(isOpen ? 'amend.stale.lead' : 'amend.stale.waiting')}</p>
      </Panel>
      <form action={carry} className="mt-4">
        <HiddenFields values={hidden} />
        {rows.length === 0 ? null : <Rows rows={rows} isOpen={isOpen} />}
        {isOpen ? (
          <p className="mt-4">
            <button type="submit" className="button button-primary">
              {words('amend.stale.carry', { count: collisions.length })}
            </button>
          </p>
        ) : null}
      </form>
    </section>
  );
}

function Rows({ rows, isOpen }: { readonly rows: readonly ThreeWayRow[]; readonly isOpen: boolean }): ReactElement {
  const side = (text: string | null): string => text ?? words('amend.stale.absent');
  return (
    <DataTable
      id="three-way"
      caption={words('amend.stale.caption')}
      columns={[
        { id: 'field', heading: words('editions.head.field') },
        { id: 'was', heading: words('amend.stale.was') },
        { id: 'now', heading: words('amend.stale.now') },
        { id: 'mine', heading: words('amend.stale.mine') },
        { id: 'choice', heading: words('amend.stale.choice') },
      ]}
      rows={rows.map((row, place): Row => ({
        id: String(place),
        cells: {
          field: words('editions.namedField', { field: row.title, name: wordsAt(`editions.field.${row.field}`) ?? row.field }),
          was: <span className="amend-lines">{side(row.was)}</span>,
          now: <span className="amend-lines">{side(row.now)}</span>,
          mine: <span className="amend-lines">{side(row.mine)}</span>,
          choice: <Choice row={row} isOpen={isOpen} />,
        },
      }))}
    />
  );
}

function Choice({ row: { key, title, field }, isOpen }: { readonly row: ThreeWayRow; readonly isOpen: boolean }): ReactElement {
  if (key === null || !isOpen) return <>{words(key === null ? 'amend.stale.both' : 'amend.stale.open')}</>;
  return (
    <fieldset>
      <legend className="sr-only">{words('amend.stale.choose', { title, field })}</legend>
      {(['mine', 'now'] as const).map((value) => (
        <label key={value} className="amend-tick">
          <input type="radio" name={`choice.${key}`} value={value} />
          <span>{words(`amend.stale.take.${value}`)}</span>
        </label>
      ))}
    </fieldset>
  );
}
