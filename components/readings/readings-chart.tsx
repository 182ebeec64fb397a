import type { ReactElement } from 'react';
import { DataTable } from '@/components/ui/data-table';
import { Disclosure } from '@/components/ui/disclosure';
import { words, wordsAt } from '@/lib/kernel/words';
import type { Chart, ChartRow } from '@/lib/readings/domain/chart';
import { sayFigure, sayUnit } from '@/lib/regions/domain/figure-words';
import { sayCompared, sayRowPart, saySubstance, sayUnitName } from './figure-words';

type Props = { readonly chart: Chart; readonly placeNames: ReadonlyMap<string, string> };

const WIDTH = 320;
const START = 12;
const END = WIDTH - 12;
const TOP = 8;
const ROW = 46;
const AXIS = 34;

const across = (at: number): number => Number((START + at * (END - START)).toFixed(2));
const idOf = ({ substance, part, unit }: Chart): string => `chart-${substance}-${part}-${unit.replace(/[^a-z0-9]/gi, '')}`;

/** Limits and readings of one substance and part on a logarithmic scale, drawn on the server, with the same in words and in a table. */
export function ReadingsChart({ chart, placeNames }: Props): ReactElement {
  const id = idOf(chart);
  const unit = sayUnitName(chart.unit);
  const height = TOP + chart.rows.length * ROW + AXIS;
  const title = words('readings-page.result.chartTitle', { substance: saySubstance(chart.substance), part: sayRowPart(chart.part), unit });
  return (
    <figure className="readings-chart">
      <figcaption className="font-sans text-plain font-strong">{title}</figcaption>
      <svg className="drawing" viewBox={`0 0 ${WIDTH} ${height}`} role="img" aria-labelledby={`${id}-title ${id}-about`}>
        <title id={`${id}-title`}>{title}</title>
        <desc id={`${id}-about`}>{aboutWords(chart, placeNames)}</desc>
        <Axis chart={chart} floor={TOP + chart.rows.length * ROW} />
        {chart.rows.map((row, place) => (
          <Row key={`${row.code}-${row.rule ?? ''}`} row={row} top={TOP + place * ROW} name={nameOf(row, placeNames)} />
        ))}
      </svg>
      <Disclosure summary={words('readings-page.result.chartTable')}>
        <Twin id={id} chart={chart} placeNames={placeNames} title={title} />
      </Disclosure>
    </figure>
  );
}

/** The place, with the strength where it is not law. */
function nameOf({ code, strength }: ChartRow, placeNames: Props['placeNames']): string {
  const name = placeNames.get(code) ?? code;
  const said = strength === null || strength === 'must' ? null : wordsAt(`regions.strength.${strength}`);
  return said === null ? name : `${name} (${said})`;
}

const readingWords = ({ compared, below }: ChartRow): string =>
  compared === null
    ? words('readings-page.result.chartNoReading')
    : words('readings-page.result.chartReading', { figure: sayCompared(compared, below) });

function aboutWords(chart: Chart, placeNames: Props['placeNames']): string {
  const rows = chart.rows.map((row) =>
    words('readings-page.result.chartRow', {
      place: nameOf(row, placeNames),
      limit: sayUnit(Number(row.limit.value), row.limit.unit),
      reading: readingWords(row),
    }),
  );
  return words('readings-page.result.chartAbout', {
    least: sayFigure(chart.least),
    most: sayFigure(chart.most),
    unit: sayUnitName(chart.unit),
    rows: rows.join(' '),
  });
}

function Axis({ chart: { ticks, unit }, floor }: { readonly chart: Chart; readonly floor: number }): ReactElement {
  return (
    <g className="stroke-rule" strokeWidth="1">
      <path d={`M${START},${floor}H${END}`} />
      {ticks.map(({ value, at }, place) => (
        <g key={value}>
          <path d={`M${across(at)},${TOP}V${floor + 5}`} strokeDasharray="1 4" />
          <text x={across(at)} y={floor + 19} stroke="none" textAnchor={anchorOf(place, ticks.length)}>
            {sayFigure(value)}
          </text>
        </g>
      ))}
      <text x={END} y={floor + 33} stroke="none" textAnchor="end">
        {sayUnitName(unit)}
      </text>
    </g>
  );
}

function anchorOf(place: number, count: number): 'start' | 'middle' | 'end' {
  if (place === 0) return 'start';
  return place === count - 1 ? 'end' : 'middle';
}

type RowProps = { readonly row: ChartRow; readonly top: number; readonly name: string };

/** The place's name, its limit as a tick, and the reading as a line from the edge; dashed where it may be anything below. */
function Row({ row, top, name }: RowProps): ReactElement {
  const line = top + 31;
  const limit = across(row.limitAt);
  return (
    <g className="stroke-iron" fill="none">
      <text x={START} y={top + 15} stroke="none">
        {name}
      </text>
      {row.comparedAt === null ? null : (
        <>
          <path d={`M${START},${line}H${across(row.comparedAt)}`} strokeWidth="3" {...(row.below ? { strokeDasharray: '5 4' } : {})} />
          <circle cx={across(row.comparedAt)} cy={line} r="4" className={row.below ? 'fill-bisque' : 'fill-iron'} strokeWidth="1.5" />
        </>
      )}
      <path d={`M${limit},${line - 10}V${line + 10}`} className="stroke-celadon" strokeWidth="3" />
      <path
        d={`M${limit - 5},${line - 10}H${limit + 5}M${limit - 5},${line + 10}H${limit + 5}`}
        className="stroke-celadon"
        strokeWidth="1.5"
      />
    </g>
  );
}

type TwinProps = Props & { readonly id: string; readonly title: string };

function Twin({ id, chart, placeNames, title }: TwinProps): ReactElement {
  return (
    <DataTable
      id={`${id}-table`}
      caption={title}
      columns={[
        { id: 'place', heading: words('readings-page.result.place') },
        { id: 'limit', heading: words('readings-page.result.chartLimit') },
        { id: 'compared', heading: words('readings-page.result.chartCompared') },
        { id: 'status', heading: words('readings-page.result.chartStatus') },
      ]}
      rows={chart.rows.map((row) => ({
        id: `${row.code}-${row.rule ?? ''}`,
        cells: {
          place: nameOf(row, placeNames),
          limit: sayUnit(Number(row.limit.value), row.limit.unit),
          compared: row.compared === null ? words('readings-page.result.chartNoReading') : sayCompared(row.compared, row.below),
          status: wordsAt(`readings-page.status.${row.status}`),
        },
      }))}
    />
  );
}
