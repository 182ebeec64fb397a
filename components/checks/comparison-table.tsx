import type { ReactElement, ReactNode } from 'react';
import { DataTable } from '@/components/ui/data-table';
import { compare, type ComparisonRow } from '@/lib/checks/domain/comparison';
import type { JudgedRule, RegionChecklist } from '@/lib/checks/domain/checklist';
import { words } from '@/lib/kernel/words';
import { sayLimit, saySubstance } from '@/lib/regions/domain/figure-words';
import { StateMark } from './state-mark';

type Props = {
  readonly regions: readonly RegionChecklist[];
  readonly placeNames: ReadonlyMap<string, string>;
  /** Address of the page, to which `?place=` leads on to one place's whole list. */
  readonly here: string;
};

const PARTS = ['inside', 'rim', 'article', 'glaze', 'metal-part'] as const;

/** What several places ask of one piece: a row a duty, a column a place. An empty cell says that we found no rule. */
export function ComparisonTable({ regions, placeNames, here }: Props): ReactElement {
  const columns = [
    { id: 'duty', heading: words('checks.compare.duty') },
    ...regions.map(({ code }) => ({ id: code, heading: placeNames.get(code) ?? code })),
  ];
  const rows = compare(regions).map((row) => ({
    id: row.id,
    cells: {
      duty: dutyWords(row),
      ...Object.fromEntries(
        regions.map(({ code }, place): [string, ReactNode] => [
          code,
          <Cell key={code} rules={row.cells[place] ?? []} here={`${here}?place=${code}`} code={code} />,
        ]),
      ),
    },
  }));
  return <DataTable id="side-by-side" caption={words('checks.compare.caption')} columns={columns} rows={rows} />;
}

function dutyWords({ topic, limit }: ComparisonRow): string {
  const part = PARTS.find((one) => one === limit?.part);
  if (limit === null || part === undefined) return words(`regions.topic.${topic}`);
  return words('checks.compare.limit', { substance: saySubstance(limit.substance), part: words(`checks.compare.parts.${part}`) });
}

type CellProps = { readonly rules: readonly JudgedRule[]; readonly here: string; readonly code: string };

function Cell({ rules, here, code }: CellProps): ReactElement {
  if (rules.length === 0) return <>{words('checks.compare.empty')}</>;
  return (
    <ul className="flex flex-col gap-3">
      {rules.map((rule) => (
        <li key={rule.id}>
          <a href={`${here}#${code}-rule-${rule.id}`}>{rule.title}</a>
          {'decision' in rule.payload ? <span className="block">{sayLimit(rule.payload)}</span> : null}
          <span className="block">
            {words(`regions.strength.${rule.strength}`)} · <StateMark state={rule.status} />
          </span>
        </li>
      ))}
    </ul>
  );
}
