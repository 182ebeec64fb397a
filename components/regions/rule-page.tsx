import type { ReactElement, ReactNode } from 'react';
import { Caution } from '@/components/checks/caution';
import { StateMark } from '@/components/checks/state-mark';
import { AmendLink } from '@/components/amend/amend-link';
import { DoubtLink } from '@/components/doubts/doubt-link';
import { PageHeading } from '@/components/ui/page-heading';
import { Panel } from '@/components/ui/panel';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { lifeOn, sayDates } from '@/lib/regions/domain/rule-dates';
import type { RuleNeighbours } from '@/lib/regions/domain/rule-neighbours';
import type { Contact } from '@/lib/regions/domain/sheet';
import type { SheetNames } from '@/lib/regions/domain/sheet-names';
import { earliestSeen } from '@/lib/regions/domain/sheet-reading';
import type { ToldRule } from '@/lib/regions/domain/told-rule';
import { ConditionSentence } from './condition-sentence';
import { ContactName } from './contact-list';
import { LookAgain } from './look-again';
import { PayloadDetails } from './payload-details';
import { RuleAttacks } from './rule-attacks';
import { SourceDetails } from './source-details';
import { StrengthLine } from './strength-line';

type Props = {
  readonly rule: ToldRule;
  readonly sheet: { readonly code: string; readonly name: string };
  readonly edition: number;
  readonly withdrawn: boolean;
  readonly names: SheetNames;
  readonly neighbours: RuleNeighbours;
  /** The one to ask first. */
  readonly authority: Contact | null;
  readonly today: CalendarDate;
  /** What readers doubted about it. */
  readonly doubts?: ReactNode;
};

/** A rule in full. */
export function RulePage(props: Props): ReactElement {
  const { rule, sheet, names, neighbours, authority, today } = props;
  const hasDetails = Object.keys(rule.payload).length > 0;
  return (
    <article className="max-w-text">
      <PageHeading>{rule.title}</PageHeading>
      <p className="mt-2 font-sans text-plain text-umber">
        {words.rich('regions.rule.of', { region: sheet.name, sheet: (said) => <a href={`/regions/${sheet.code}`}>{said}</a> })}
      </p>
      <Withdrawn edition={props.edition} withdrawn={props.withdrawn} />
      <div className="mt-4 flex flex-col gap-4">
        <LookAgain rule={rule} today={today} authority={authority?.name ?? null} />
        <StrengthLine strength={rule.strength} standing={rule.standing} evidence={rule.evidence} />
        <p className="text-lead">{rule.says}</p>
        {rule.note === undefined ? null : <p>{rule.note}</p>}
        <Caution seenOn={earliestSeen([rule]) ?? today} authority={authority === null ? undefined : <ContactName contact={authority} />} />
      </div>
      <Part id="conditions">
        <ConditionSentence condition={rule.when} names={names} />
      </Part>
      {hasDetails ? (
        <Part id="details">
          <PayloadDetails payload={rule.payload} />
        </Part>
      ) : null}
      <Part id="sources">
        <SourceDetails sources={rule.sources} />
      </Part>
      <Part id="attacks">
        <RuleAttacks rule={rule} neighbours={neighbours} />
        {rule.firm ? <p className="mt-4">{words('regions.rule.firm')}</p> : null}
      </Part>
      <Part id="dates">
        <Dates rule={rule} edition={props.edition} today={today} />
      </Part>
      {props.doubts}
      <RuleLinks rule={rule} withdrawn={props.withdrawn} />
    </article>
  );
}

/** Where one goes on from a rule. What is withdrawn is neither doubted nor amended. */
function RuleLinks({ rule, withdrawn }: Pick<Props, 'rule' | 'withdrawn'>): ReactElement {
  return (
    <ul className="not-in-print mt-8 font-sans text-plain">
      <li>
        <a className="inline-block py-2" href={`/sources?rule=${rule.id}`}>
          {words('library.sources.ofRule')}
        </a>
      </li>
      {withdrawn ? null : (
        <>
          <li>
            <DoubtLink rule={rule} />
          </li>
          <li>
            <AmendLink rule={rule} />
          </li>
        </>
      )}
      <li>
        <a className="inline-block py-2" href={`/api/v1/rules/${rule.id}`}>
          {words('regions.rule.data')}
        </a>
      </li>
    </ul>
  );
}

type PartProps = { readonly id: 'conditions' | 'details' | 'sources' | 'attacks' | 'dates'; readonly children: ReactNode };

function Part({ id, children }: PartProps): ReactElement {
  return (
    <section className="mt-8" aria-labelledby={id}>
      <h2 id={id}>{words(`regions.part.${id}`)}</h2>
      <div className="mt-3">{children}</div>
    </section>
  );
}

function Withdrawn({ edition, withdrawn }: Pick<Props, 'edition' | 'withdrawn'>): ReactElement | null {
  if (!withdrawn) return null;
  return (
    <div className="mt-4">
      <Panel colour="ash">
        <StateMark state="withdrawn" />
        <p>{words('regions.rule.withdrawn', { number: edition })}</p>
      </Panel>
    </div>
  );
}

function Dates({ rule, edition, today }: Pick<Props, 'rule' | 'edition' | 'today'>): ReactElement {
  const life = lifeOn(rule, today);
  const dates = sayDates(rule);
  return (
    <ul className="font-sans text-plain">
      <li>{life === 'in-force' ? dates : words('regions.dates.life', { life: words(`regions.life.${life}`), dates })}</li>
      <li>{words('regions.rule.lookAgainBy', { date: sayDate(rule.lookAgainBy) })}</li>
      <li>
        <a href={`/regions/${rule.region}/editions/${String(edition)}`}>{words('regions.rule.edition', { number: edition })}</a>
      </li>
    </ul>
  );
}
