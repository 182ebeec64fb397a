import type { ReactElement } from 'react';
import { Instant } from '@/components/stewards/instant';
import { DataTable } from '@/components/ui/data-table';
import { words } from '@/lib/kernel/words';

type Line = {
  readonly id: string;
  readonly place: string;
  readonly rule: string | null;
  readonly ruleTitle: string | null;
  readonly words: string;
  readonly madeAt: Date;
  readonly isWaiting: boolean;
};

type Props = { readonly doubts: readonly Line[] };

const COLUMNS = [
  { id: 'rule', heading: words('doubts.desk.rule') },
  { id: 'made', heading: words('doubts.desk.made') },
  { id: 'words', heading: words('doubts.desk.words') },
  { id: 'act', heading: words('doubts.desk.act') },
];

const SHOWN = 240;

/** The beginning of a longer text. */
const shortened = (text: string): string => (text.length <= SHOWN ? text : `${Array.from(text).slice(0, SHOWN).join('')}…`);

/** What a doubt is about, in words. */
export function aboutWords({ rule, ruleTitle }: Pick<Line, 'rule' | 'ruleTitle'>): string {
  if (ruleTitle !== null) return ruleTitle;
  return rule === null ? words('doubts.desk.whole') : words('doubts.desk.gone', { id: rule });
}

/** Doubts of one state. */
export function DoubtTable({ doubts }: Props): ReactElement {
  return (
    <DataTable
      id="doubts"
      caption={words('doubts.desk.caption')}
      columns={COLUMNS}
      rows={doubts.map((doubt) => ({
        id: doubt.id,
        cells: {
          rule: (
            <>
              {aboutWords(doubt)} <span className="text-umber">({doubt.place})</span>
            </>
          ),
          made: <Instant at={doubt.madeAt} />,
          words: <span className="whitespace-pre-line break-words">{shortened(doubt.words)}</span>,
          act: (
            <a href={`/doubts/${doubt.id}`} aria-label={words('doubts.desk.readOf', { rule: aboutWords(doubt) })}>
              {words(doubt.isWaiting ? 'doubts.desk.read' : 'doubts.desk.readAgain')}
            </a>
          ),
        },
      }))}
    />
  );
}
