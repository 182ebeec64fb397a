import type { ReactElement } from 'react';
import { DataTable } from '@/components/ui/data-table';
import { sayList } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { sayDecision, sayPart, saySubstance, sayUnit } from '@/lib/regions/domain/figure-words';
import type { LimitRow } from '@/lib/regions/domain/limit-rows';
import type { SheetNames } from '@/lib/regions/domain/sheet-names';
import { MemoryMark, StrengthLine } from './strength-line';
import { TermLinks } from './term-links';

type Props = {
  readonly rows: readonly LimitRow[];
  readonly place: { readonly code: string; readonly name: string };
  readonly names: SheetNames;
};

const COLUMNS = [
  { id: 'rule', heading: words('regions.limits.rule') },
  { id: 'substance', heading: words('regions.limits.substance') },
  { id: 'category', heading: words('regions.limits.category') },
  { id: 'figure', heading: words('regions.limits.figure'), numeric: true },
  { id: 'decision', heading: words('regions.limits.decision') },
  { id: 'word', heading: words('regions.limits.word') },
] as const;

/** Every limit of a line: substance, kind of ware, figure, how lab figures are judged, whose word it is. */
export function LimitsTable({ rows, place, names }: Props): ReactElement {
  return (
    <DataTable
      id="limits-table"
      caption={words('regions.limits.caption', { name: place.name })}
      columns={COLUMNS}
      rows={rows.map((row) => ({
        id: row.rule.id,
        cells: {
          rule: <RuleCell row={row} own={place.code} names={names} />,
          substance: <a href={`/substances/${row.limit.substance.toLowerCase()}`}>{saySubstance(row.limit.substance)}</a>,
          category: <TermLinks categories={row.categories} />,
          figure: <Figure row={row} />,
          decision: <DecisionCell row={row} />,
          word: <StrengthLine strength={row.rule.strength} standing={row.rule.standing} />,
        },
      }))}
    />
  );
}

type RowProps = { readonly row: LimitRow };

function RuleCell({
  row: { rule, silencedBy },
  own,
  names,
}: RowProps & { readonly own: string; readonly names: SheetNames }): ReactElement {
  return (
    <>
      <a href={`/rules/${rule.id}`}>{rule.title}</a>
      {rule.region === own ? null : (
        <span className="block text-small font-normal text-umber">
          {words('regions.limits.from', { name: names.regions.get(rule.region) ?? rule.region })}
        </span>
      )}
      {silencedBy.length === 0 ? null : (
        <span className="block text-small font-normal text-umber">
          {words('regions.limits.silenced', { rules: sayList(silencedBy.map(({ title }) => title)) })}
        </span>
      )}
    </>
  );
}

function Figure({ row: { limit } }: RowProps): ReactElement {
  return (
    <>
      {sayUnit(limit.amount.value, limit.amount.unit)}
      <span className="block text-small text-umber">{sayPart(limit)}</span>
      {limit.amount.evidence === 'memory' ? <MemoryMark /> : null}
    </>
  );
}

function DecisionCell({ row: { limit } }: RowProps): ReactElement {
  return (
    <>
      {sayDecision(limit.decision).join(' ')} {limit.decision.evidence === 'memory' ? <MemoryMark /> : null}
    </>
  );
}
