import type { ReactElement } from 'react';
import { Note } from '@/components/accounts/note';
import { Panel } from '@/components/ui/panel';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate, sayList } from '@/lib/kernel/say';
import { words, wordsAt } from '@/lib/kernel/words';
import type { AlsoOpen } from '@/lib/regions/domain/amendment-view';

type Props = {
  readonly done: string | undefined;
  /** What was just saved, by name. */
  readonly saved: string | null;
  readonly why: string | undefined;
  readonly alsoOpen: readonly AlsoOpen[];
  readonly titleOf: (line: string) => string;
};

/** What was just done, why something was not, and who else is at it. */
export function DraftNotices({ done, saved, why, alsoOpen, titleOf }: Props): ReactElement {
  const did = done === undefined ? null : wordsAt(`amend.done.${done}`);
  const not = why === undefined ? null : (wordsAt(`amend.refused.${why}`) ?? words('amend.refused.other'));
  return (
    <div className="mt-4 flex max-w-text flex-col gap-4">
      {saved === null ? null : <Note>{words('amend.done.saved', { title: saved })}</Note>}
      {did === null ? null : <Note>{did}</Note>}
      {not === null ? null : (
        <Panel colour="copper">
          <p role="alert">{not}</p>
        </Panel>
      )}
      {alsoOpen.map(({ since, state, items }) => (
        <Panel key={since.toISOString()} colour="cobalt">
          <p>
            {words('amend.draft.alsoOpen', {
              date: sayDate(calendarDateOf(since)),
              state: words(`amend.state.${state}`),
              items: sayList(items.map(titleOf)),
            })}
          </p>
        </Panel>
      ))}
    </div>
  );
}
