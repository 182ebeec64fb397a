import type { ReactElement } from 'react';
import { DataTable } from '@/components/ui/data-table';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';

type Edition = {
  readonly number: number;
  readonly inUseFrom: string;
  readonly inUseTo: string | null;
  readonly hash: string;
  readonly summary: string;
  readonly withdrawn: { readonly reason: string; readonly broughtBackAs: number } | null;
};

type Props = { readonly sheet: { readonly code: string; readonly name: string }; readonly editions: readonly Edition[] };

const COLUMNS = [
  { id: 'number', heading: words('regions.editions.number') },
  { id: 'from', heading: words('regions.editions.from') },
  { id: 'to', heading: words('regions.editions.to') },
  { id: 'summary', heading: words('regions.editions.summary') },
  { id: 'hash', heading: words('regions.editions.hash') },
] as const;

/** Every edition of a sheet, the newest first. */
export function EditionsTable({ sheet, editions }: Props): ReactElement {
  return (
    <DataTable
      id="editions"
      caption={words('regions.editions.caption', { name: sheet.name })}
      columns={COLUMNS}
      rows={editions.toReversed().map(({ number, inUseFrom, inUseTo, hash, summary, withdrawn }) => ({
        id: String(number),
        cells: {
          number: <a href={`/regions/${sheet.code}/editions/${String(number)}`}>{words('regions.editions.link', { number })}</a>,
          from: <Instant at={inUseFrom} />,
          to: inUseTo === null ? words('regions.editions.now') : <Instant at={inUseTo} />,
          summary: <Summary code={sheet.code} number={number} summary={summary} withdrawn={withdrawn} />,
          hash: <code className="break-all text-small">{hash}</code>,
        },
      }))}
    />
  );
}

type SummaryProps = Pick<Edition, 'number' | 'summary' | 'withdrawn'> & { readonly code: string };

/** What an edition is, what it changed, and why it was withdrawn if it was. */
function Summary({ code, number, summary, withdrawn }: SummaryProps): ReactElement {
  if (number === 1) return <>{summary}</>;
  const address = `/regions/${code}/editions/compare?from=${String(number - 1)}&to=${String(number)}`;
  return (
    <>
      {summary}
      {withdrawn === null ? null : <span className="mt-2 block">{words('regions.editions.withdrawn', withdrawn)}</span>}{' '}
      <a href={address} aria-label={words('editions.linkOf', { number })} className="block">
        {words('editions.link')}
      </a>
    </>
  );
}

function Instant({ at }: { readonly at: string }): ReactElement {
  return <time dateTime={at}>{sayDate(calendarDateOf(new Date(at)))}</time>;
}
