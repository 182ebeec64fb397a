import {
  compileLine,
  type CompiledLine,
  type CompileFault,
  type EngineRule,
  type EngineTerm,
  type LineInput,
  type Place,
} from '@/lib/checks/domain/line';
import type { Question } from '@/lib/checks/domain/questions';
import { parseCalendarDate, type CalendarDate } from '@/lib/kernel/calendar-date';
import type { Condition } from '@/lib/regions/domain/condition';

/** A date known to be one. */
export function day(text: string): CalendarDate {
  const date = parseCalendarDate(text);
  if (date === null) throw new Error(`Not a date: ${text}`);
  return date;
}

/** A rule of the one layer "qq", in force always; the rest as given. */
export const aRule = (id: string, when: Condition, rest: Partial<EngineRule> = {}): EngineRule => ({
  id,
  region: 'qq',
  kind: 'adds',
  targets: [],
  alongside: [],
  when,
  from: null,
  to: null,
  order: 0,
  firm: false,
  ...rest,
});

export const aTerm = (id: string, when: Condition, rest: Partial<EngineTerm> = {}): EngineTerm => ({
  id,
  region: 'qq',
  when,
  from: null,
  to: null,
  ...rest,
});

type Parts = Partial<LineInput> & { readonly rules?: readonly EngineRule[]; readonly terms?: readonly EngineTerm[] };

const inputOf = ({ rules = [], terms = [], ...rest }: Parts): LineInput => ({
  questions: [],
  layers: [{ region: 'qq', rules, terms }],
  except: [],
  on: day('2026-12-01'),
  places: [],
  ...rest,
});

/** A line that must compile. */
export function aLine(parts: Parts): CompiledLine {
  const line = compileLine(inputOf(parts));
  if (!line.ok) throw new Error(`The line was refused: ${JSON.stringify(line.error)}`);
  return line.value;
}

/** The fault of a line that must not compile. */
export function faultOf(parts: Parts): CompileFault {
  const line = compileLine(inputOf(parts));
  if (line.ok) throw new Error('The line was taken');
  return line.error;
}

export const yesno = (id: string): Question => ({ id, topic: 'use', kind: 'yesno' });
export const region = (id: string): Question => ({ id, topic: 'selling', kind: 'region' });
export const choice = (id: string, options: readonly string[]): Question => ({ id, topic: 'use', kind: 'choice', options });

export const PLACES: readonly Place[] = [
  { code: 'eu', line: ['eu'] },
  { code: 'dk', line: ['eu', 'dk'] },
  { code: 'se', line: ['eu', 'se'] },
  { code: 'us', line: ['us'] },
  { code: 'us-ca', line: ['us', 'us-ca'] },
];
