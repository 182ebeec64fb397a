import { parseCalendarDate } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import type { TrialStatus } from '@/lib/regions/domain/trial';
import type { Finding } from './finding';

/** A finding as an editor reads it: how heavy it is, where it stands, and what to do about it. */
export type SaidFinding = { readonly level: string; readonly where: string; readonly text: string };

const STATUSES: readonly TrialStatus[] = ['applies', 'does-not-apply', 'not-settled', 'treat-as-applying', 'sources-disagree'];
/** Values that hold a status, empty where there is no line at all, and those that hold a day. */
const HOLDS_STATUS = new Set(['expected', 'found', 'before', 'after']);
const HOLDS_DATE = new Set(['on', 'from', 'to', 'by']);

/** Faults of a line below that need words of their own; the others cannot come about by a change above. */
const BREAKS = [
  'unknown-term',
  'attack-on-firm',
  'attack-not-downwards',
  'too-many-cells',
  'too-many-questions',
  'too-many-nodes',
] as const;

/** The words of a finding. */
export function sayFinding({ level, at, kind, values }: Finding): SaidFinding {
  const field = at.field === '' ? words('sheet-checks.whole') : at.field;
  const { about = '' } = values;
  const said = Object.entries(values).map(
    ([name, value]) => [name, name === 'why' ? sayBreak(value, about) : inWords(name, value)] as const,
  );
  return {
    level: words(`sheet-checks.level.${level}`),
    where: words(`sheet-checks.where.${at.list}`, { id: at.id, field }),
    text: words(`sheet-checks.kind.${kind}`, Object.fromEntries(said)),
  };
}

const sayBreak = (why: string | number, about: string | number): string =>
  words(`sheet-checks.why.${BREAKS.find((kind) => kind === why) ?? 'other'}`, { about });

function inWords(name: string, value: string | number): string | number {
  if (typeof value === 'number') return value;
  if (HOLDS_STATUS.has(name)) return words(`sheet-checks.status.${STATUSES.find((status) => status === value) ?? 'none'}`);
  const date = HOLDS_DATE.has(name) ? parseCalendarDate(value) : null;
  return date === null ? value : sayDate(date);
}
