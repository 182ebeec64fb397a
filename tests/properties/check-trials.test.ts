import fc from 'fast-check';
import { expect, test } from 'vitest';
import { judge } from '@/lib/checks/domain/judge';
import { runTrial } from '@/lib/checks/domain/trial-run';
import { typedAnswer } from '@/lib/checks/domain/typed-answer';
import type { Trial } from '@/lib/regions/domain/trial';
import { compiled } from './compiled';
import { cases, day, RUNS } from './systems';

test('CHECK-77 a trial piece is judged as a check is: its own statuses pass, and any other one is told with what was found', () => {
  const seen = new Set<string>();
  fc.assert(
    fc.property(cases, ({ input, answers: half, declined }) => {
      const line = compiled(input);
      const answers = Object.fromEntries(
        input.questions.flatMap((question) => {
          const value = half[question.id];
          const answer = value === undefined ? null : typedAnswer(question, question.kind === 'amount' ? Number(value) : asJson(value));
          return answer === null ? [] : [[question.id, answer]];
        }),
      );
      const passed = declined.filter((id) => !(id in answers));
      const outcomes = judge(line, answers, passed);
      const expected = Object.fromEntries(outcomes.map(({ id, status }) => [id, status]));
      const trial: Trial = { id: 't', title: 'A piece', on: day('2026-12-01'), answers: asJson(answers), declined: passed, expected };
      expect(runTrial(line, trial, input.questions)).toEqual([]);
      for (const { id, status } of outcomes) {
        seen.add(status);
        const other = status === 'applies' ? 'does-not-apply' : 'applies';
        const wrong = runTrial(line, { ...trial, expected: { [id]: other } }, input.questions);
        expect(wrong).toEqual([{ kind: 'otherwise', rule: id, expected: other, found: status }]);
      }
    }),
    RUNS,
  );
  expect([...seen].sort()).toEqual(['applies', 'does-not-apply', 'not-settled', 'sources-disagree', 'treat-as-applying']);
});

/** As a document holds it. */
const asJson = (value: unknown) => JSON.parse(JSON.stringify(value)) as Trial['answers'];
