import type { ReactElement, ReactNode } from 'react';
import { StateMark } from '@/components/checks/state-mark';
import { ConditionSentence } from '@/components/regions/condition-sentence';
import { SourceDetails } from '@/components/regions/source-details';
import { StrengthLine } from '@/components/regions/strength-line';
import { Badge } from '@/components/ui/badge';
import { PageHeading } from '@/components/ui/page-heading';
import { Panel } from '@/components/ui/panel';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { words } from '@/lib/kernel/words';
import { lifeOn, sayDates } from '@/lib/regions/domain/rule-dates';
import type { SheetNames } from '@/lib/regions/domain/sheet-names';
import type { TermUses } from '@/lib/regions/domain/term-uses';
import type { ToldTerm } from '@/lib/regions/domain/told-sheet';

type Props = {
  readonly term: ToldTerm;
  readonly sheet: { readonly code: string; readonly name: string };
  readonly edition: number;
  readonly withdrawn: boolean;
  readonly uses: TermUses;
  readonly names: SheetNames;
  readonly today: CalendarDate;
};

/** A word that rules of a sheet use: what it means there, when it holds of a piece, and what rests on it. */
export function TermPage({ term, sheet, edition, withdrawn, uses, names, today }: Props): ReactElement {
  return (
    <article className="max-w-text">
      <PageHeading>{term.name}</PageHeading>
      <p className="mt-2 flex flex-wrap items-center gap-2 font-sans text-plain text-umber">
        <span>
          {words.rich('library.term.of', {
            region: sheet.name,
            sheet: (said) => <a href={`/regions/${sheet.code}#term-${term.id}`}>{said}</a>,
          })}
        </span>
        {term.category ? <Badge>{words('regions.terms.category')}</Badge> : null}
      </p>
      {withdrawn ? (
        <Panel colour="ash">
          <StateMark state="withdrawn" />
          <p>{words('library.term.withdrawn', { number: edition })}</p>
        </Panel>
      ) : null}
      <p className="mt-4 text-lead">{term.says}</p>
      <Dates term={term} today={today} />
      <Part id="holds" title={words('regions.terms.holds')}>
        <ConditionSentence condition={term.when} names={names} of="term" />
        <p className="mt-4">{words('library.term.only', { region: sheet.name })}</p>
      </Part>
      <Part id="uses" title={words('library.term.uses')}>
        <Uses uses={uses} home={sheet.code} />
      </Part>
      <Part id="sources" title={words('regions.part.sources')}>
        {term.sources.length === 0 ? <p>{words('library.term.noSource')}</p> : <SourceDetails sources={term.sources} />}
      </Part>
      <p className="not-in-print mt-8 font-sans text-plain">
        <a className="inline-block py-2" href={`/contact?about=/terms/${term.id}`}>
          {words('library.term.doubt')}
        </a>
      </p>
    </article>
  );
}

function Part({ id, title, children }: { readonly id: string; readonly title: string; readonly children: ReactNode }): ReactElement {
  return (
    <section className="mt-8" aria-labelledby={id}>
      <h2 id={id}>{title}</h2>
      <div className="mt-3">{children}</div>
    </section>
  );
}

/** Dates are said where there are any: most words have held since before our records. */
function Dates({ term, today }: Pick<Props, 'term' | 'today'>): ReactElement | null {
  if (term.from === null && term.to === null) return null;
  const life = lifeOn(term, today);
  const dates = sayDates(term);
  const said = life === 'in-force' ? dates : words('regions.dates.life', { life: words(`regions.life.${life}`), dates });
  return <p className="mt-2 font-sans text-plain text-umber">{said}</p>;
}

function Uses({ uses: { rules, terms }, home }: { readonly uses: TermUses; readonly home: string }): ReactElement {
  if (rules.length + terms.length === 0) return <p>{words('library.term.unused')}</p>;
  const placed = (place: { readonly code: string; readonly name: string }): ReactNode =>
    place.code === home ? null : <> {words('library.term.inPlace', { place: place.name })}</>;
  return (
    <>
      <p>{words('library.term.count', { rules: rules.length, terms: terms.length })}</p>
      <ul className="mt-2">
        {rules.map(({ id, title, place, ...how }) => (
          <li key={id} className="keep-together border-b border-rule py-3">
            <a href={`/rules/${id}`}>{title}</a>
            {placed(place)}
            <StrengthLine {...how} />
          </li>
        ))}
        {terms.map(({ id, title, place }) => (
          <li key={id} className="keep-together border-b border-rule py-3">
            <a href={`/terms/${id}`}>{words('library.sources.term', { name: title })}</a>
            {placed(place)}
          </li>
        ))}
      </ul>
    </>
  );
}
