import type { ReactElement } from 'react';
import { Panel } from '@/components/ui/panel';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { lastSeen } from '@/lib/regions/domain/sheet-reading';
import type { ToldRule } from '@/lib/regions/domain/told-rule';

type Props = {
  readonly rule: ToldRule;
  readonly today: CalendarDate;
  /** The authority to check with; without a name, "the authority of that place". */
  readonly authority?: string | null;
};

/** Stands above a rule that is past its look-again date; nothing otherwise. */
export function LookAgain({ rule, today, authority }: Props): ReactElement | null {
  if (rule.lookAgainBy >= today) return null;
  const seen = lastSeen(rule);
  const asked = authority ?? words('regions.rule.anyAuthority');
  return (
    <Panel colour="ash">
      <p className="font-sans text-plain">
        {seen === null
          ? words('regions.rule.lookAgainOverdue', { date: sayDate(rule.lookAgainBy), authority: asked })
          : words('regions.rule.lookAgainPast', { seen: sayDate(seen), authority: asked })}
      </p>
    </Panel>
  );
}
