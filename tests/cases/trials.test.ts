import { expect, test } from 'vitest';
import type { CompiledLine } from '@/lib/checks/domain/line';
import { QUESTIONS } from '@/lib/checks/domain/questions';
import { runTrial } from '@/lib/checks/domain/trial-run';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { Trial } from '@/lib/regions/domain/trial';
import { seedLine, seedSheets } from '../builders/seed-sheets';

/* The trial pieces stand in the sheets themselves, beside the rules whose sources they are reasoned from. */
const pieces = [...seedSheets.values()].flatMap(({ code, trials }) =>
  trials.map((trial): readonly [name: string, code: string, trial: Trial] => [`${code}/${trial.id}`, code, trial]),
);

const compiled = new Map<string, CompiledLine>();
function lineOf(code: string, on: CalendarDate): CompiledLine {
  const key = `${code} ${on}`;
  const line = compiled.get(key) ?? seedLine(code, on).compiled;
  compiled.set(key, line);
  return line;
}

test.each(pieces)('CHECK-77 the trial piece %s comes out as its sheet says', (_, code, trial) => {
  expect(runTrial(lineOf(code, trial.on), trial, QUESTIONS)).toEqual([]);
});

test('CHECK-77 every place whose sheet holds a limit of its own has eight trial pieces at least, every other three', () => {
  const few = [...seedSheets.values()]
    .filter(({ kind }) => kind !== 'base' && kind !== 'standard')
    .filter(({ rules, trials }) => trials.length < (rules.some(({ payload }) => payload.topic === 'limit') ? 8 : 3));
  expect(few.map(({ code }) => code)).toEqual([]);
});

test('CHECK-77 no trial piece stands twice in a sheet', () => {
  const twice = [...seedSheets.values()].flatMap(({ code, trials }) => {
    const ids = trials.map(({ id }) => id);
    return ids.filter((id, place) => ids.indexOf(id) !== place).map((id) => `${code}/${id}`);
  });
  expect(twice).toEqual([]);
});
