import type { ReactElement } from 'react';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';

/** "1 December 2026, 10:02", in UTC: stewards read it beside logs. */
export function Instant({ at }: { readonly at: Date }): ReactElement {
  return (
    <time dateTime={at.toISOString()}>
      {sayDate(calendarDateOf(at))}, {at.toISOString().slice(11, 16)}
    </time>
  );
}
