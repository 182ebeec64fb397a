import type { Why } from '@/lib/checks/domain/why';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { SheetNames } from '@/lib/regions/domain/sheet-names';
import type { ToldRule, ToldSource } from '@/lib/regions/domain/told-rule';

/** What the lines of one place's checklist need to be shown. */
export type ListView = {
  readonly code: string;
  readonly told: ReadonlyMap<string, ToldRule>;
  readonly sheetNames: SheetNames;
  readonly placeNames: ReadonlyMap<string, string>;
  /** Questions each open line turns on. */
  readonly open: ReadonlyMap<string, readonly string[]>;
  /** Why each line stands as it does. */
  readonly whys: ReadonlyMap<string, Why>;
  readonly declined: readonly string[];
  /** Address of the check, to answer from the list; null on a dated copy. */
  readonly base: string | null;
  readonly today: CalendarDate;
  readonly authority: string | null;
  readonly numberOf: (source: ToldSource) => number;
};
