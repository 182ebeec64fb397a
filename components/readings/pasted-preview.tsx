import type { ReactElement } from 'react';
import { DataTable } from '@/components/ui/data-table';
import { sayList } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import type { PastedLine } from '@/lib/readings/domain/pasted-rows';
import type { RowList } from '@/lib/readings/domain/typed-rows';
import { sayRowFigure, sayRowPart, saySubstance } from './figure-words';
import { whyOf } from './sheet-fault-words';

type Props = { readonly list: RowList; readonly lines: readonly PastedLine[] };

/** What was understood of pasted rows and what was not, line by line. */
export function PastedPreview({ list, lines }: Props): ReactElement | null {
  if (lines.length === 0) return null;
  return (
    <section className="mt-6" aria-labelledby={`${list}-preview-heading`} id={`${list}-preview`}>
      <h3 id={`${list}-preview-heading`}>{words(`readings-page.rows.preview.${list}`)}</h3>
      <DataTable
        id={`${list}-pasted-lines`}
        caption={words('readings-page.rows.count', { count: countOf(lines, 'understood'), bad: countOf(lines, 'not-understood') })}
        columns={[
          { id: 'line', heading: words('readings-page.rows.line') },
          { id: 'typed', heading: words('readings-page.rows.typed') },
          { id: 'read', heading: words('readings-page.rows.read') },
        ]}
        rows={lines.map((line) => ({
          id: String(line.line),
          cells: {
            line: line.line,
            typed: <bdi className="wrap-anywhere">{line.text.replaceAll('\t', ' · ')}</bdi>,
            read: <span className={line.kind === 'not-understood' ? 'field-error' : undefined}>{lineWords(line)}</span>,
          },
        }))}
      />
    </section>
  );
}

const countOf = (lines: readonly PastedLine[], kind: PastedLine['kind']): number => lines.filter((line) => line.kind === kind).length;

function lineWords(line: PastedLine): string {
  switch (line.kind) {
    case 'heading':
      return line.ignored.length === 0
        ? words('readings-page.rows.headingLine')
        : words('readings-page.rows.ignored', { columns: sayList(line.ignored) });
    case 'understood':
      return words('readings-page.rows.understood', {
        specimen: line.row.specimen,
        part: sayRowPart(line.row.part),
        substance: saySubstance(line.row.substance),
        figure: sayRowFigure(line.row),
      });
    case 'not-understood': {
      const why = whyOf({ field: '', place: 'readings', why: line.why });
      return words('readings-page.rows.notUnderstood', { why: `${why.charAt(0).toUpperCase()}${why.slice(1)}.` });
    }
  }
}
