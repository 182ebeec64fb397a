import type { ReactElement } from 'react';
import { MemoryMark, StrengthLine } from '@/components/regions/strength-line';
import { DataTable } from '@/components/ui/data-table';
import { sayList } from '@/lib/kernel/say';
import { words, wordsAt } from '@/lib/kernel/words';
import { sayFigure, sayLimit, sayPart, sayUnit } from '@/lib/regions/domain/figure-words';
import type { ComparedLimit, ComparedPlace, ComparedRow } from '@/lib/regions/domain/limit-comparison';
import type { LimitRow } from '@/lib/regions/domain/limit-rows';

type Props = {
  readonly places: readonly ComparedPlace[];
  readonly rows: readonly ComparedRow[];
  /** Codes of the places that have a limit in some row, shown or not. */
  readonly known: ReadonlySet<string>;
  readonly name: string;
};

/** Our name for the row's kind of ware, or the place's own where it fits none of ours. */
export const wareWords = ({ ware, name }: Pick<ComparedRow, 'ware' | 'name'>): string =>
  ware === null ? name : words(`library.limits.ware.${ware}`);

/** One row a kind of ware, one column a place. */
export function LimitComparisonTable({ places, rows, known, name }: Props): ReactElement {
  return (
    <DataTable
      id="comparison"
      caption={words('library.limits.caption', { name })}
      columns={[{ id: 'ware', heading: words('library.limits.kind') }, ...places.map(({ code, name: heading }) => ({ id: code, heading }))]}
      rows={rows.map((row) => ({
        id: row.id,
        cells: {
          ware: wareWords(row),
          ...Object.fromEntries(
            places.map((place) => [
              place.code,
              <Cell key={place.code} place={place} limits={row.cells[place.code] ?? []} hasOthers={known.has(place.code)} />,
            ]),
          ),
        },
      }))}
    />
  );
}

type CellProps = { readonly place: ComparedPlace; readonly limits: readonly ComparedLimit[]; readonly hasOthers: boolean };

function Cell({ place, limits, hasOthers }: CellProps): ReactElement {
  if (limits.length === 0)
    return <span className="text-umber">{words(hasOthers ? 'library.limits.notApart' : 'library.limits.notFound')}</span>;
  return (
    <ul className="flex flex-col gap-3">
      {limits.map((limit) => (
        <li key={limit.row.rule.id}>
          <Limit limit={limit} place={place} />
        </li>
      ))}
    </ul>
  );
}

type LimitProps = { readonly limit: ComparedLimit; readonly place: ComparedPlace };

/** The figure as the source gives it, exactly the same in our unit where that differs, and how well it is known. */
function Limit({ limit: { row, shared }, place }: LimitProps): ReactElement {
  const { rule, limit } = row;
  const isUnclear = limit.decision.atLimit === 'unclear';
  return (
    <>
      <a href={`/rules/${rule.id}`}>{isUnclear ? sayUnit(limit.amount.value, limit.amount.unit) : sayLimit(limit)}</a>
      {isUnclear ? <span className="block text-small">{words('regions.atLimit.unclear')}</span> : null}
      {shared === null ? null : (
        <span className="block text-small">{words('library.limits.same', { figure: saidShared(shared.value, shared.unit) })}</span>
      )}
      {notesOf(row, place).map((note) => (
        <span key={note} className="block text-small text-umber">
          {note}
        </span>
      ))}
      <StrengthLine strength={rule.strength} standing={rule.standing} />
      {limit.amount.evidence === 'memory' ? <MemoryMark /> : <span className="text-small text-umber">{words('library.limits.read')}</span>}
    </>
  );
}

/** Of what it is a share, the place's own word for the ware, which layer it comes from, and to which rules it gives way. */
function notesOf({ rule, limit, categories, silencedBy }: LimitRow, place: ComparedPlace): readonly string[] {
  return [
    sayPart(limit),
    ...(categories.length === 0 ? [] : [sayList(categories.map(({ name }) => name))]),
    ...(rule.region === place.code ? [] : [words('regions.limits.from', { name: place.layers.get(rule.region) ?? rule.region })]),
    ...(silencedBy.length === 0 ? [] : [words('regions.limits.silenced', { rules: sayList(silencedBy.map(({ title }) => title)) })]),
  ];
}

const saidShared = (value: string, unit: string): string =>
  words('regions.figure', { value: sayFigure(Number(value)), unit: wordsAt(`regions.unit.${unit}`) ?? unit });
