import type { ReactElement, ReactNode } from 'react';
import { AmendLink } from '@/components/amend/amend-link';
import { DoubtLink } from '@/components/doubts/doubt-link';
import { Disclosure } from '@/components/ui/disclosure';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { sayDates } from '@/lib/regions/domain/rule-dates';
import type { SheetNames } from '@/lib/regions/domain/sheet-names';
import type { ToldRule, ToldSource } from '@/lib/regions/domain/told-rule';
import { ConditionSentence } from './condition-sentence';
import { LookAgain } from './look-again';
import { PayloadDetails } from './payload-details';
import { SourceDetails, SourceLink } from './source-details';
import { StrengthLine } from './strength-line';

type Props = {
  readonly rule: ToldRule;
  readonly names: SheetNames;
  readonly today: CalendarDate;
  /** Of the card's heading. */
  readonly level: 3 | 4;
  readonly authority?: string | null;
  /** Where the page has a numbered list of its sources: the number in it. */
  readonly numberOf?: (source: ToldSource) => number;
  /** Before the card's ids, where a page may show the same rule twice. */
  readonly prefix?: string;
  /** How much to unfold: all there is, or in a checklist what to do it by and the source; conditions and notes stand on the rule's page. */
  readonly details?: 'all' | 'source';
  /** What belongs between the rule and its details: its state for a piece, the answers that led to it. */
  readonly children?: ReactNode;
};

/** Topics whose details one needs at hand to act: figures, exact words, fields. */
const DONE_BY: readonly ToldRule['topic'][] = ['limit', 'label', 'paper', 'registration'];

/** A rule as a list shows it: what to do, whose word it is, and the rest one step away. Takes props alone and fetches nothing. */
export function RuleCard({
  rule,
  names,
  today,
  level,
  authority = null,
  numberOf,
  prefix = '',
  details = 'all',
  children,
}: Props): ReactElement {
  const Heading = `h${level}` as const;
  return (
    <article id={`${prefix}rule-${rule.id}`} className="keep-together border-b border-rule py-4">
      <Heading>
        <a href={`/rules/${rule.id}`}>{rule.title}</a>
      </Heading>
      <StrengthLine strength={rule.strength} standing={rule.standing} evidence={rule.evidence} />
      <LookAgain rule={rule} today={today} authority={authority} />
      <p className="mt-2">{rule.says}</p>
      {children}
      {details === 'all' ? (
        <Disclosure summary={words('regions.rule.more')}>
          <RuleDetails rule={rule} names={names} numberOf={numberOf} />
        </Disclosure>
      ) : (
        <Disclosure summary={words('regions.rule.moreSource')}>
          {DONE_BY.includes(rule.topic) ? <PayloadDetails payload={rule.payload} /> : null}
          <SourceDetails sources={rule.sources} numberOf={numberOf} />
          <p className="font-sans text-plain text-umber">{sayDates(rule)}.</p>
        </Disclosure>
      )}
      <p className="flex flex-wrap gap-x-6 font-sans text-plain">
        <DoubtLink rule={rule} />
        {details === 'all' ? <AmendLink rule={rule} /> : null}
      </p>
    </article>
  );
}

type DetailsProps = Pick<Props, 'rule' | 'names'> & { readonly numberOf?: Props['numberOf'] | undefined };

function RuleDetails({ rule, names, numberOf }: DetailsProps): ReactElement {
  return (
    <div className="flex flex-col gap-4">
      <ConditionSentence condition={rule.when} names={names} />
      <PayloadDetails payload={rule.payload} />
      {rule.note === undefined ? null : <p className="text-plain">{rule.note}</p>}
      <SourceDetails sources={rule.sources} numberOf={numberOf} />
      <p className="font-sans text-plain text-umber">
        {sayDates(rule)}. {words('regions.rule.lookAgainBy', { date: sayDate(rule.lookAgainBy) })}.{' '}
        {rule.firm ? words('regions.rule.firm') : null}
      </p>
    </div>
  );
}

type LineProps = { readonly rule: ToldRule; readonly numberOf: (source: ToldSource) => number };

/** A rule in one short block, for the layers above: its own sheet and page have the rest. */
export function RuleLine({ rule, numberOf }: LineProps): ReactElement {
  return (
    <li className="keep-together border-b border-rule py-3">
      <p className="font-strong">
        <a href={`/rules/${rule.id}`}>{rule.title}</a>
      </p>
      <StrengthLine strength={rule.strength} standing={rule.standing} evidence={rule.evidence} />
      <p>{rule.says}</p>
      <ul className="flex flex-wrap gap-x-4 font-sans text-plain text-umber">
        {rule.sources.map((source, place) => (
          <li key={place}>
            <SourceLink number={numberOf(source)} locator={source.locator} />
          </li>
        ))}
      </ul>
    </li>
  );
}
