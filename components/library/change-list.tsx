import type { ReactElement } from 'react';
import { sayDate } from '@/lib/kernel/say';
import { LOCALE, words } from '@/lib/kernel/words';
import type { Change, MonthOfChanges } from '@/lib/regions/domain/changes';

const MONTH = new Intl.DateTimeFormat(LOCALE, { month: 'long', year: 'numeric', timeZone: 'UTC' });

/** "December 2026" of "2026-12". */
const sayMonth = (month: string): string => MONTH.format(new Date(`${month}-01T00:00:00Z`));

type Props = { readonly id: 'coming' | 'past'; readonly months: readonly MonthOfChanges[] };

/** Changes under the heading of their month. */
export function ChangeList({ id, months }: Props): ReactElement {
  return (
    <section className="mt-12" aria-labelledby={id}>
      <h2 id={id}>{words(`library.changes.${id}.title`)}</h2>
      {months.length === 0 ? <p className="mt-2">{words(`library.changes.${id}.none`)}</p> : null}
      {months.map(({ month, changes }) => (
        <div key={month} className="mt-6">
          <h3>{sayMonth(month)}</h3>
          <ul className="mt-2 max-w-text">
            {changes.map((change) => (
              <li key={keyOf(change)} className="border-b border-rule py-3">
                <p className="font-sans text-plain text-umber">
                  <time dateTime={change.date}>{sayDate(change.date)}</time>
                </p>
                {change.kind === 'edition' ? <Edition change={change} /> : <Rules change={change} when={id} />}
              </li>
            ))}
          </ul>
        </div>
      ))}
    </section>
  );
}

const keyOf = (change: Change): string =>
  change.kind === 'edition'
    ? `${change.date} ${String(change.number)} ${change.places[0]?.code ?? ''}`
    : `${change.date} ${change.kind} ${change.place.code}`;

/** A single sheet's edition is told in a line; many at once by their names. */
function Edition({ change: { number, summary, places } }: { readonly change: Extract<Change, { kind: 'edition' }> }): ReactElement {
  const [first] = places;
  if (first !== undefined && places.length === 1) {
    return (
      <p>
        {words.rich('library.changes.edition', {
          place: first.name,
          number,
          link: (said) => <a href={`/regions/${first.code}/editions/${String(number)}`}>{said}</a>,
        })}{' '}
        {summary}
        {number > 1 ? (
          <>
            {' '}
            <a href={comparison(first.code, number)}>{words('library.changes.compare', { number: number - 1 })}</a>
          </>
        ) : null}
      </p>
    );
  }
  return (
    <>
      <p>
        {words('library.changes.editions', { count: places.length, number })} {summary}
      </p>
      <ul className="flex flex-wrap gap-x-4 font-sans text-plain">
        {places.map(({ code, name }) => (
          <li key={code}>
            <a href={number > 1 ? comparison(code, number) : `/regions/${code}/editions/1`}>{name}</a>
          </li>
        ))}
      </ul>
    </>
  );
}

/** Held against the edition before it. */
const comparison = (code: string, number: number): string =>
  `/regions/${code}/editions/compare?from=${String(number - 1)}&to=${String(number)}`;

type RulesProps = { readonly change: Exclude<Change, { kind: 'edition' }>; readonly when: Props['id'] };

function Rules({ change: { kind, place, rules }, when }: RulesProps): ReactElement {
  const count = rules.length;
  return (
    <>
      <p>
        {words.rich(kind === 'look-again' ? 'library.changes.rules.look-again.past' : `library.changes.rules.${kind}.${when}`, {
          place: place.name,
          count,
          link: (said) => <a href={`/regions/${place.code}`}>{said}</a>,
        })}
      </p>
      <ul className="ms-6 list-disc">
        {rules.map(({ id, title }) => (
          <li key={id}>
            <a href={`/rules/${id}`}>{title}</a>
          </li>
        ))}
      </ul>
    </>
  );
}
