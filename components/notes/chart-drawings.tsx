import { scaleLinear, scalePoint } from 'd3-scale';
import type { ReactElement } from 'react';
import type { ConeChart, ConeRow } from '@/lib/pieces/domain/cone';
import { Label, Thin } from './cut-piece';
import { DrawingFrame, drawingWords } from './drawing-frame';

/** The worked example of the water test: grams dry and soaked. */
const [DRY, SOAKED] = [120, 123.6];

/** Two weighings as bars at one true scale, from zero. */
export function Absorption(): ReactElement {
  const [foot, tall, wide] = [186, 150, 62];
  const height = scaleLinear([0, DRY], [0, tall]);
  const water = height(SOAKED) - height(DRY);
  return (
    <DrawingFrame name="absorption" height={216}>
      <g className="stroke-iron" strokeWidth="1.2">
        <rect x="40" y={foot - tall} width={wide} height={tall} className="fill-oxide" />
        <rect x="150" y={foot - tall} width={wide} height={tall} className="fill-oxide" />
        <rect x="150" y={foot - tall - water} width={wide} height={water} className="fill-cobalt" />
      </g>
      <Thin d={`M20,${foot}H236M214,${foot - tall - water / 2}H226`} />
      <Label x={40 + wide / 2} y={foot + 20} anchor="middle">
        {drawingWords('absorption', 'dry')}
      </Label>
      <Label x={150 + wide / 2} y={foot + 20} anchor="middle">
        {drawingWords('absorption', 'soaked')}
      </Label>
      <Label x={228} y={foot - tall + 4}>
        {drawingWords('absorption', 'water')}
      </Label>
    </DrawingFrame>
  );
}

const FIRST = '010';
const LAST = '10';
const NAMED = ['010', '06', '03', '1', '6', '10'];

/** The rows of a chart between two cones, half cones left out. */
function rowsOf(charts: readonly ConeChart[], celsiusAnHour: number): readonly ConeRow[] {
  const rows = charts.find((chart) => chart.series === 'self-supporting' && chart.celsiusAnHour === celsiusAnHour)?.rows ?? [];
  const whole = rows.filter(({ cone }) => !cone.includes('.'));
  const place = (cone: string): number => whole.findIndex((row) => row.cone === cone);
  return whole.slice(place(FIRST), place(LAST) + 1);
}

/** Bending points of self-standing cones at two speeds, with the line that everybody asks about. */
export function ConeBending({ charts }: { readonly charts: readonly ConeChart[] }): ReactElement {
  const [slow, fast] = [rowsOf(charts, 60), rowsOf(charts, 150)];
  const across = scalePoint(
    slow.map(({ cone }) => cone),
    [56, 306],
  );
  const up = scaleLinear([880, 1320], [196, 20]);
  const said = (part: string): string => drawingWords('cone-chart', part);
  const x = ({ cone }: ConeRow): number => across(cone) ?? 0;
  return (
    <DrawingFrame name="cone-chart" height={240}>
      <Thin d="M46,14V200H312" />
      <Thin d={`M46,${up(1000)}H312`} dashed />
      {[900, 1100, 1200, 1300].map((degrees) => (
        <Label key={degrees} x={40} y={up(degrees) + 5} anchor="end">
          {String(degrees)}
        </Label>
      ))}
      <Label x={40} y={up(1000) + 5} anchor="end">
        1000
      </Label>
      {NAMED.map((cone) => (
        <Label key={cone} x={across(cone) ?? 0} y={218} anchor="middle">
          {cone}
        </Label>
      ))}
      <Label x={306} y={236} anchor="end">
        {said('cone')}
      </Label>
      <g className="stroke-iron" strokeWidth="1.2">
        {slow.map((row) => (
          <circle key={row.cone} cx={x(row)} cy={up(row.celsius)} r="3.2" className={fillOf(row)} />
        ))}
        {fast.map((row) => (
          <path key={row.cone} d={`M${x(row) - 4},${up(row.celsius) + 3}h8l-4,-7Z`} className={fillOf(row)} />
        ))}
        <circle cx="72" cy="31" r="3.2" className="fill-iron" />
        <path d="M68,53h8l-4,-7Z" className="fill-iron" />
      </g>
      <Label x={84} y={36}>
        {said('slow')}
      </Label>
      <Label x={84} y={55}>
        {said('fast')}
      </Label>
    </DrawingFrame>
  );
}

const fillOf = ({ evidence }: ConeRow): string => (evidence === 'read' ? 'fill-iron' : 'fill-bisque');
