import type { ReactElement } from 'react';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { LIFE, type Amendment } from '@/lib/regions/domain/amendment';
import { StateBadge } from './own-list';
import { PressButton } from './press-button';

type Act = (form: FormData) => Promise<void>;
type Props = {
  readonly amendment: Amendment;
  readonly isOpen: boolean;
  readonly hidden: Readonly<Record<string, string>>;
  readonly submission: () => string;
  readonly acts: { readonly takeBack: Act; readonly withdraw: Act; readonly reopen: Act };
  readonly page: string;
};

/** Where the amendment stands, and what can be done with it as a whole. */
export function DraftHead({ amendment, isOpen, hidden, submission, acts, page }: Props): ReactElement {
  const { state, region, baseNumber, editionNumber, changedAt } = amendment;
  const may = (act: 'take-back' | 'withdraw' | 'reopen'): boolean => LIFE[act][state] !== undefined;
  return (
    <div className="mt-4 max-w-text">
      <p>
        <StateBadge state={state} /> {words(`amend.means.${state}`)}
      </p>
      <p className="mt-2 font-sans text-plain text-umber">
        {baseNumber === null ? words('amend.draft.noBase') : words('amend.draft.base', { number: baseNumber })}{' '}
        {words('amend.own.changed', { date: sayDate(calendarDateOf(changedAt)) })}
      </p>
      {editionNumber === null ? null : (
        <p className="mt-2">
          <a href={`/regions/${region}/editions/${String(editionNumber)}`}>{words('amend.draft.edition', { number: editionNumber })}</a>
        </p>
      )}
      <div className="mt-4 flex flex-wrap gap-3">
        {isOpen ? (
          <a className="button button-primary" href={`${page}/check`}>
            {words('amend.draft.check')}
          </a>
        ) : null}
        {may('take-back') ? (
          <PressButton action={acts.takeBack} hidden={{ ...hidden, key: submission() }}>
            {words('amend.draft.takeBack')}
          </PressButton>
        ) : null}
        {may('withdraw') ? (
          <PressButton action={acts.withdraw} hidden={{ ...hidden, key: submission() }}>
            {words('amend.draft.withdraw')}
          </PressButton>
        ) : null}
        {may('reopen') ? (
          <PressButton action={acts.reopen} hidden={{ ...hidden, key: submission() }} kind="primary">
            {words('amend.draft.reopen')}
          </PressButton>
        ) : null}
      </div>
    </div>
  );
}
