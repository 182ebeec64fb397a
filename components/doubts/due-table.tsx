import type { ReactElement } from 'react';
import { DataTable } from '@/components/ui/data-table';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import type { DueRule } from '@/lib/regions/domain/look-again-list';

type Props = {
  readonly rules: readonly DueRule[];
  /** Names of those who keep a sheet, by its code. */
  readonly keepers: ReadonlyMap<string, readonly string[]>;
};

const COLUMNS = [
  { id: 'rule', heading: words('doubts.look.rule') },
  { id: 'day', heading: words('doubts.look.day') },
  { id: 'sheet', heading: words('doubts.look.sheet') },
  { id: 'kept', heading: words('doubts.look.kept') },
  { id: 'act', heading: words('doubts.look.act') },
];

const whenWords = (daysLeft: number): string =>
  daysLeft < 0 ? words('doubts.look.overdue', { days: -daysLeft }) : words('doubts.look.left', { days: daysLeft });

/** Rules to be read afresh, each with the way to amend it. */
export function DueTable({ rules, keepers }: Props): ReactElement {
  return (
    <DataTable
      id="due"
      caption={words('doubts.look.caption')}
      columns={COLUMNS}
      rows={rules.map(({ id, title, region, place, lookAgainBy, daysLeft }) => ({
        id,
        cells: {
          rule: <a href={`/rules/${id}`}>{title}</a>,
          day: (
            <>
              <time dateTime={lookAgainBy}>{sayDate(lookAgainBy)}</time> ({whenWords(daysLeft)})
            </>
          ),
          sheet: <a href={`/regions/${region}`}>{place}</a>,
          kept: (keepers.get(region) ?? []).join(', ') || words('doubts.look.nobodyKeeps'),
          act: (
            <a href={`/regions/${region}/amend?item=rules/${id}`} aria-label={words('doubts.look.amendOf', { title })}>
              {words('doubts.look.amend')}
            </a>
          ),
        },
      }))}
    />
  );
}
