import type { ReactElement, ReactNode } from 'react';
import { Panel } from '@/components/ui/panel';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';

type Props = {
  /** Name or link of the authority to ask; without one the words for any authority stand. */
  readonly authority?: ReactNode;
  /** The day of the latest reading the list rests on. */
  readonly seenOn: CalendarDate;
};

/** The caution on every result. Neither to be folded nor to be dismissed; printed too. */
export function Caution({ authority, seenOn }: Props): ReactElement {
  return (
    <Panel colour="ash" label={words('site.caution.label')}>
      <p>
        {words.rich('site.caution.list', {
          date: sayDate(seenOn),
          strong: (said) => <strong className="font-strong">{said}</strong>,
          day: (said) => <time dateTime={seenOn}>{said}</time>,
          authority: (said) => authority ?? said,
        })}
      </p>
    </Panel>
  );
}
