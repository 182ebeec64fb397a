import type { ReactElement } from 'react';
import { Badge } from '@/components/ui/badge';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import type { Amendment, AmendmentState } from '@/lib/regions/domain/amendment';

/** A line of an author's own list. */
export type OwnRow = { readonly amendment: Amendment; readonly name: string; readonly items: number; readonly isStale: boolean };

/** What waits on the author comes first, then what waits on others, then what is over. */
const PARTS: readonly (readonly [part: 'you' | 'moderators' | 'over', states: readonly AmendmentState[]])[] = [
  ['you', ['sent-back', 'refused-stale', 'draft']],
  ['moderators', ['sent', 'held', 'once-approved']],
  ['over', ['in-use', 'withdrawn']],
];

export function OwnList({ rows }: { readonly rows: readonly OwnRow[] }): ReactElement {
  if (rows.length === 0) {
    return (
      <div className="mt-6">
        <p>{words('amend.own.none')}</p>
        <p className="mt-3">
          <a href="/regions">{words('amend.own.choose')}</a>
        </p>
      </div>
    );
  }
  return (
    <>
      {PARTS.map(([part, states]) => {
        const own = states.flatMap((state) => rows.filter(({ amendment }) => amendment.state === state));
        return own.length === 0 ? null : (
          <section key={part} className="mt-8" aria-labelledby={`own-${part}`}>
            <h2 id={`own-${part}`}>{words(`amend.own.part.${part}`)}</h2>
            <ul className="mt-3" role="list">
              {own.map((row) => (
                <OwnLine key={row.amendment.id} row={row} />
              ))}
            </ul>
          </section>
        );
      })}
    </>
  );
}

function OwnLine({ row: { amendment, name, items, isStale } }: { readonly row: OwnRow }): ReactElement {
  const { id, state, summary, changedAt } = amendment;
  return (
    <li className="border-b border-rule py-3">
      <a href={`/bench/amendments/${id}`} className="font-strong">
        {words('amend.own.line', { name, count: items })}
      </a>{' '}
      <StateBadge state={state} /> {isStale ? <Badge colour="ash">{words('amend.own.stale')}</Badge> : null}
      {summary === '' ? null : <p>{summary}</p>}
      <p className="font-sans text-plain text-umber">{words('amend.own.changed', { date: sayDate(calendarDateOf(changedAt)) })}</p>
    </li>
  );
}

const COLOURS: Readonly<Record<AmendmentState, 'plain' | 'celadon' | 'ash' | 'copper' | 'cobalt'>> = {
  draft: 'plain',
  sent: 'cobalt',
  held: 'ash',
  'sent-back': 'copper',
  'once-approved': 'cobalt',
  withdrawn: 'plain',
  'in-use': 'celadon',
  'refused-stale': 'copper',
};

/** Where an amendment is in its life, in a word. */
export function StateBadge({ state }: { readonly state: AmendmentState }): ReactElement {
  return <Badge colour={COLOURS[state]}>{words(`amend.state.${state}`)}</Badge>;
}
