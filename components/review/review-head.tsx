import { Fragment, type ReactElement, type ReactNode } from 'react';
import { DefinitionList } from '@/components/ui/definition-list';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate, sayInstant } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import type { Review } from '@/lib/regions/domain/amendment-view';
import { daysBetween } from './waiting-words';

/** The layers a place is read from, the widest first; empty for a place without a sheet. */
export type LineOf = readonly { readonly code: string; readonly name: string }[];

type Props = { readonly review: Review; readonly line: LineOf; readonly now: Date };

/** Whose amendment it is, since when it waits, what it starts from, and how many have to approve. */
export function ReviewHead({ review, line, now }: Props): ReactElement {
  const { amendment, author, name, openElsewhere } = review;
  const { sentAt, baseNumber, region, summary, state } = amendment;
  const entries: readonly { readonly id: string; readonly value: ReactNode }[] = [
    { id: 'why', value: <span className="whitespace-pre-line wrap-anywhere">{summary}</span> },
    { id: 'line', value: <RegionLine line={line} name={name} /> },
    { id: 'author', value: author },
    ...(sentAt === null ? [] : [{ id: 'sent', value: <SentOn at={sentAt} now={now} /> }]),
    {
      id: 'base',
      value:
        baseNumber === null ? (
          words('review.head.baseNone')
        ) : (
          <a href={`/regions/${region}/editions/${String(baseNumber)}`}>{words('review.head.baseEdition', { number: baseNumber })}</a>
        ),
    },
    { id: 'state', value: words(`review.state.${state}`) },
    { id: 'approvals', value: words(`review.head.${approvalsSaid(review)}`) },
    {
      id: 'open',
      value:
        openElsewhere === null
          ? words('review.head.openNone')
          : words('review.head.openBy', { by: openElsewhere.by, at: sayInstant(openElsewhere.at) }),
    },
  ];
  return (
    <section aria-label={words('review.head.label')} className="mt-4 max-w-text">
      <DefinitionList entries={entries.map(({ id, value }) => ({ id, name: NAMES[id] ?? '', value }))} />
    </section>
  );
}

const NAMES: Readonly<Record<string, string>> = {
  why: words('review.head.why'),
  line: words('review.head.line'),
  author: words('review.head.author'),
  sent: words('review.head.sent'),
  base: words('review.head.base'),
  state: words('review.head.state'),
  approvals: words('review.head.approvals'),
  open: words('review.head.open'),
};

const approvalsSaid = ({ needed, given }: Review): 'one' | 'twoNone' | 'twoOne' =>
  needed === 1 ? 'one' : given === 0 ? 'twoNone' : 'twoOne';

function SentOn({ at, now }: { readonly at: Date; readonly now: Date }): ReactElement {
  return (
    <>
      {words.rich('review.head.sentDays', {
        date: sayDate(calendarDateOf(at)),
        days: daysBetween(at, now),
        day: (said) => <time dateTime={at.toISOString()}>{said}</time>,
      })}
    </>
  );
}

function RegionLine({ line, name }: { readonly line: LineOf; readonly name: string }): ReactElement {
  if (line.length === 0) return <>{words('review.head.newPlace', { name })}</>;
  return (
    <>
      {line.map(({ code, name: layer }, place) => (
        <Fragment key={code}>
          {place === 0 ? null : <span aria-hidden="true"> › </span>}
          <a href={`/regions/${code}`}>{layer}</a>
        </Fragment>
      ))}
    </>
  );
}
