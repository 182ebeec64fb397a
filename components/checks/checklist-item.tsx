import type { ReactElement, ReactNode } from 'react';
import { RuleCard } from '@/components/regions/rule-card';
import type { JudgedRule } from '@/lib/checks/domain/checklist';
import type { ToldRule } from '@/lib/regions/domain/told-rule';
import { words } from '@/lib/kernel/words';
import { BecauseLine } from './because-line';
import type { ListView } from './list-view';
import { questionWords } from './question-words';
import { StateMark } from './state-mark';
import { WhyDetails } from './why-details';

type Props = { readonly judged: JudgedRule; readonly view: ListView };

/** One line of a checklist: the rule, how it stands for this piece and why, and what it still turns on. */
export function ChecklistItem({ judged, view }: Props): ReactElement | null {
  const rule = view.told.get(judged.id);
  if (rule === undefined) return null;
  return (
    <RuleCard
      rule={rule}
      names={view.sheetNames}
      today={view.today}
      level={4}
      authority={view.authority}
      numberOf={view.numberOf}
      prefix={`${view.code}-`}
      details="source"
    >
      <div className="mt-2 font-sans text-plain">
        <StateMark state={judged.status} />
      </div>
      <Reason judged={judged} view={view} />
      <Silenced judged={judged} told={view.told} />
      <Exceptions judged={judged} told={view.told} />
      <WhyDetails id={judged.id} view={view} />
    </RuleCard>
  );
}

/** A line that does not apply, in short: what it is, and why not. Its page has the rest. */
export function SpentLine({ judged, view }: Props): ReactElement {
  return (
    <li id={`${view.code}-rule-${judged.id}`} className="keep-together border-b border-rule py-3">
      <p className="font-strong">
        <a href={`/rules/${judged.id}`}>{judged.title}</a>
      </p>
      <BecauseLine because={judged.because} names={view.placeNames} />
      <Silenced judged={judged} told={view.told} />
    </li>
  );
}

function Reason({ judged, view }: Props): ReactElement {
  const open = view.open.get(judged.id) ?? [];
  if (open.length === 0) return <BecauseLine because={judged.because} names={view.placeNames} />;
  return (
    <div className="mt-2 font-sans text-plain">
      <p>{words('checks.result.openQuestions')}</p>
      <ul className="list-disc ps-6">
        {open.map((id) => (
          <li key={id}>
            <OpenQuestion id={id} base={view.base} isDeclined={view.declined.includes(id)} />
          </li>
        ))}
      </ul>
    </div>
  );
}

type OpenProps = { readonly id: string; readonly base: string | null; readonly isDeclined: boolean };

/** A question a line turns on: a link to answer it, and for one that nobody could answer how to find out. */
function OpenQuestion({ id, base, isDeclined }: OpenProps): ReactElement {
  const name = questionWords(id, 'short');
  return (
    <>
      {base === null ? name : <a href={`${base}/${id}`}>{name}</a>}
      {isDeclined ? <>. {questionWords(id, 'findOut')}</> : null}
    </>
  );
}

type Told = ReadonlyMap<string, ToldRule>;

const RuleLinks = ({ rules }: { readonly rules: readonly ToldRule[] }): ReactNode =>
  rules.map(({ id, title, says }) => (
    <li key={id}>
      <a href={`/rules/${id}`}>{title}</a>. {says}
    </li>
  ));

/** R3: an exception or a replacement that applies, with what it says. */
function Silenced({ judged, told }: { readonly judged: JudgedRule; readonly told: Told }): ReactElement | null {
  const rules = judged.silencedBy.flatMap((id) => told.get(id) ?? []);
  if (rules.length === 0) return null;
  return (
    <div className="mt-2 font-sans text-plain">
      <p>{words('checks.result.silenced')}</p>
      <ul className="list-disc ps-6">
        <RuleLinks rules={rules} />
      </ul>
    </div>
  );
}

/** While a line is open: the exceptions that may yet stand in its way. */
function Exceptions({ judged, told }: { readonly judged: JudgedRule; readonly told: Told }): ReactElement | null {
  if (judged.status !== 'not-settled' && judged.status !== 'treat-as-applying') return null;
  const rules = [...told.values()].filter(({ kind, targets }) => kind === 'excepts' && targets.includes(judged.id));
  if (rules.length === 0) return null;
  return (
    <div className="mt-2 font-sans text-plain">
      <p>{words('checks.result.mayBeSilenced')}</p>
      <ul className="list-disc ps-6">
        <RuleLinks rules={rules} />
      </ul>
    </div>
  );
}
