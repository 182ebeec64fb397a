import type { ReactElement } from 'react';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import type { Said } from '@/lib/day-book/domain/told-line';
import { saidName } from './said-name';

type Answered = {
  readonly id: string;
  readonly words: string;
  readonly elsewhere: string | null;
  readonly link: string | null;
  readonly answer: string;
  readonly by: Said;
  readonly on: Date;
};

type Props = { readonly waiting: number; readonly answered: readonly Answered[] };

/** What readers doubted about a rule: how many wait, and those that were answered, as plain text. */
export function RuleDoubts({ waiting, answered }: Props): ReactElement {
  return (
    <section className="mt-8" aria-labelledby="doubts">
      <h2 id="doubts">{words('doubts.onRule.title')}</h2>
      {waiting === 0 && answered.length === 0 ? <p className="mt-3">{words('doubts.onRule.none')}</p> : null}
      {waiting === 0 ? null : <p className="mt-3">{words('doubts.onRule.waiting', { count: waiting })}</p>}
      {answered.length === 0 ? null : (
        <ul className="mt-3" role="list">
          {answered.map((doubt) => (
            <li key={doubt.id} className="keep-together border-b border-rule py-4">
              <AnsweredDoubt doubt={doubt} />
            </li>
          ))}
        </ul>
      )}
    </section>
  );
}

function AnsweredDoubt({ doubt: { words: written, elsewhere, link, answer, by, on } }: { readonly doubt: Answered }): ReactElement {
  return (
    <dl className="definitions">
      <Entry name={words('doubts.onRule.doubt')} text={written} />
      {elsewhere === null ? null : <Entry name={words('doubts.onRule.elsewhere')} text={elsewhere} />}
      {link === null ? null : <Entry name={words('doubts.onRule.address')} text={link} />}
      <Entry name={words('doubts.onRule.answer')} text={answer} />
      <div>
        <dt className="sr-only">{words('doubts.onRule.answer')}</dt>
        <dd className="text-umber">{words('doubts.onRule.answered', { who: saidName(by), date: sayDate(calendarDateOf(on)) })}</dd>
      </div>
    </dl>
  );
}

function Entry({ name, text }: { readonly name: string; readonly text: string }): ReactElement {
  return (
    <div>
      <dt>{name}</dt>
      <dd className="whitespace-pre-line break-words">{text}</dd>
    </div>
  );
}
