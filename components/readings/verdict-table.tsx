import type { ReactElement, ReactNode } from 'react';
import { DataTable } from '@/components/ui/data-table';
import { words } from '@/lib/kernel/words';
import type { RegionVerdicts, Verdict } from '@/lib/readings/domain/verdict';
import { sayRowPart, saySubstance } from './figure-words';
import { VerdictCell } from './verdict-cell';

type Props = {
  readonly regions: readonly RegionVerdicts[];
  readonly placeNames: ReadonlyMap<string, string>;
  readonly isBelow: (substance: string, part: string) => boolean;
};

/** One row a substance and part, one column a place. A place that says nothing of them says so. */
export function VerdictTable({ regions, placeNames, isBelow }: Props): ReactElement {
  return (
    <DataTable
      id="verdicts"
      caption={words('readings-page.result.caption')}
      columns={[
        { id: 'what', heading: words('readings-page.result.what') },
        ...regions.map(({ code }) => ({ id: `place-${code}`, heading: placeNames.get(code) ?? code })),
      ]}
      rows={rowsOf(regions).map(({ substance, part }) => ({
        id: `${substance}-${part}`,
        cells: {
          what: words('readings-page.result.rowOf', { substance: saySubstance(substance), part: sayRowPart(part) }),
          ...Object.fromEntries(
            regions.map(({ code, verdicts }): [string, ReactNode] => [
              `place-${code}`,
              <Cell
                key={code}
                verdicts={verdicts.filter((one) => one.substance === substance && one.part === part)}
                below={isBelow(substance, part)}
              />,
            ]),
          ),
        },
      }))}
    />
  );
}

type What = Pick<Verdict, 'substance' | 'part'>;

/** Lead first, then cadmium, as reports have them; the rest as they are met. */
function rowsOf(regions: readonly RegionVerdicts[]): readonly What[] {
  const all = new Map<string, What>();
  for (const { substance, part } of regions.flatMap(({ verdicts }) => verdicts)) all.set(`${substance} ${part}`, { substance, part });
  return [...all.values()].sort((a, b) => rankOf(a) - rankOf(b));
}

const FIRST = ['Pb', 'Cd'];
const rankOf = ({ substance }: What): number => (FIRST.includes(substance) ? FIRST.indexOf(substance) : FIRST.length);

function Cell({ verdicts, below }: { readonly verdicts: readonly Verdict[]; readonly below: boolean }): ReactElement {
  if (verdicts.length === 0) return <>{words('readings-page.result.none')}</>;
  return (
    <ul className="flex flex-col gap-4">
      {verdicts.map((verdict) => (
        <li key={`${verdict.rule ?? 'none'}-${verdict.per ?? ''}`} className="keep-together verdict">
          <VerdictCell verdict={verdict} below={below} />
        </li>
      ))}
    </ul>
  );
}
