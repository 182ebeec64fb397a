import type { ReactElement } from 'react';
import { Caution } from '@/components/checks/caution';
import { ContactList } from '@/components/regions/contact-list';
import { DataTable } from '@/components/ui/data-table';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { sayDate, sayList } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { belowAmong, chartsOf } from '@/lib/readings/domain/chart';
import type { SheetEntry } from '@/lib/readings/domain/sheet-entry';
import type { RegionVerdicts } from '@/lib/readings/domain/verdict';
import { sayRowFigure, sayRowPart, saySubstance } from './figure-words';
import { ReadingsChart } from './readings-chart';
import { VerdictTable } from './verdict-table';

type Props = {
  readonly regions: readonly RegionVerdicts[];
  readonly on: CalendarDate;
  readonly entry: SheetEntry;
  readonly placeNames: ReadonlyMap<string, string>;
};

/** How the figures stand, place by place: caution first, then the table, the drawings, what was read, and whom to ask. */
export function ReadingsResult({ regions, on, entry, placeNames }: Props): ReactElement {
  const rows = [...entry.rows.readings, ...entry.rows.further];
  const isBelow = belowAmong(rows);
  const charts = chartsOf(regions, isBelow);
  const authorities = regions.flatMap(({ authorities: list }) => list.slice(0, 1).map(({ name }) => name));
  return (
    <>
      <p className="mt-4">{words('readings-page.result.drawn', { date: sayDate(on) })}</p>
      <div className="mt-4 max-w-text">
        <Caution seenOn={firstSeen(regions) ?? on} authority={authorities.length === 0 ? undefined : sayList([...new Set(authorities)])} />
      </div>
      <p className="mt-4 max-w-text">{words('readings-page.result.covers')}</p>
      <div className="mt-6">
        <VerdictTable regions={regions} placeNames={placeNames} isBelow={isBelow} />
      </div>
      {charts.length === 0 ? null : (
        <section className="mt-8" aria-labelledby="charts">
          <h2 id="charts">{words('readings-page.result.chart')}</h2>
          <p className="field-hint mt-2">{words('readings-page.result.chartKey')}</p>
          <div className="readings-charts mt-4">
            {charts.map((chart) => (
              <ReadingsChart key={`${chart.substance}-${chart.part}-${chart.unit}`} chart={chart} placeNames={placeNames} />
            ))}
          </div>
        </section>
      )}
      <Classes regions={regions} placeNames={placeNames} />
      <Entered entry={entry} />
      {regions.map((region) => (
        <WhomToAskOf key={region.code} region={region} placeNames={placeNames} />
      ))}
    </>
  );
}

function firstSeen(regions: Props['regions']): CalendarDate | null {
  const days = regions.flatMap(({ verdicts }) =>
    verdicts.flatMap(({ sources }) => sources.flatMap(({ seenOn }) => (seenOn === undefined ? [] : [seenOn]))),
  );
  return days.sort()[0] ?? null;
}

type PlacesProps = Pick<Props, 'regions' | 'placeNames'>;

function Classes({ regions, placeNames }: PlacesProps): ReactElement | null {
  const classes = regions.flatMap(({ code, categories }) => {
    const names = categories.filter(({ possible }) => possible).map(({ name }) => name);
    return names.length === 0 ? [] : [{ code, names }];
  });
  if (classes.length === 0) return null;
  return (
    <section className="mt-8" aria-labelledby="classes">
      <h2 id="classes">{words('readings-page.result.classes')}</h2>
      <p>{words('checks.result.sectionTexts.categories')}</p>
      <ul className="mt-2 ms-6 list-disc">
        {classes.map(({ code, names }) => (
          <li key={code}>{words('readings-page.result.class', { place: placeNames.get(code) ?? code, names: sayList(names) })}</li>
        ))}
      </ul>
    </section>
  );
}

/** The figures as they were understood, so that a printed page says what it rests on. */
function Entered({ entry: { rows } }: Pick<Props, 'entry'>): ReactElement {
  const lists = (['readings', 'further'] as const).flatMap((list) => rows[list].map((row) => ({ ...row, list })));
  return (
    <section className="mt-8" aria-labelledby="entered">
      <h2 id="entered">{words('readings-page.result.entry')}</h2>
      <DataTable
        id="entered-rows"
        caption={words('readings-page.result.entryCaption')}
        columns={[
          { id: 'specimen', heading: words('readings-page.rows.column.specimen') },
          { id: 'part', heading: words('readings-page.rows.column.part') },
          { id: 'substance', heading: words('readings-page.rows.column.substance') },
          { id: 'value', heading: words('readings-page.rows.column.value') },
        ]}
        rows={lists.map((row) => ({
          id: [row.list, row.specimen, row.part, row.substance].join('-'),
          cells: {
            specimen: (
              <>
                <bdi>{row.specimen}</bdi>, {words(row.list === 'readings' ? 'readings-page.result.first' : 'readings-page.result.further')}
              </>
            ),
            part: sayRowPart(row.part),
            substance: saySubstance(row.substance),
            value: sayRowFigure(row),
          },
        }))}
      />
    </section>
  );
}

type AskProps = { readonly region: RegionVerdicts; readonly placeNames: Props['placeNames'] };

function WhomToAskOf({ region: { code, authorities, accreditation }, placeNames }: AskProps): ReactElement {
  const id = `${code}-ask`;
  const names = { terms: new Map(), regions: placeNames };
  return (
    <section className="mt-8" aria-labelledby={id}>
      <h2 id={id}>{words('readings-page.result.ask', { place: placeNames.get(code) ?? code })}</h2>
      {authorities.length === 0 ? (
        <p>{words('checks.result.noAuthority')}</p>
      ) : (
        <ContactList contacts={authorities} own={code} names={names} />
      )}
      <p className="mt-4 max-w-text">{words('checks.result.lab')}</p>
      <ContactList contacts={accreditation} own={code} names={names} />
    </section>
  );
}
