import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { sayDate, sayList } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';

type Shown = {
  /** Sources of what is shown. */
  readonly sources: readonly { readonly seenOn?: CalendarDate }[];
  /** For each place its authorities, the one to ask first leading. */
  readonly authorities: readonly (readonly { readonly name: string }[])[];
  readonly on: CalendarDate;
};

/** The caution that stands on every result: not proof, as read on the earliest day, whom to ask, and that a lab must test. */
export function cautionFor({ sources, authorities, on }: Shown): string {
  const [first = on] = sources.flatMap(({ seenOn }) => (seenOn === undefined ? [] : [seenOn])).sort();
  const names = firstAuthorities(authorities);
  const plain = (chunks: string): string => chunks;
  return words.markup('site.caution.list', {
    date: sayDate(first),
    strong: plain,
    day: plain,
    authority: (unnamed) => names ?? unnamed,
  });
}

/** The authority to ask first in each place, as a phrase. Null where none is known. */
export function firstAuthorities(authorities: Shown['authorities']): string | null {
  const names = authorities.flatMap((list) => list.slice(0, 1).map(({ name }) => name));
  return names.length === 0 ? null : sayList([...new Set(names)]);
}
