import fc from 'fast-check';
import { expect, test } from 'vitest';
import { judge } from '@/lib/checks/domain/judge';
import type { Answers } from '@/lib/checks/domain/knowledge';
import type { CompiledLine } from '@/lib/checks/domain/line';
import { nextQuestion, questionsOpenFor, stillMatters } from '@/lib/checks/domain/next-question';
import { UNKNOWN } from '@/lib/kernel/tri';
import { compiled, inWords } from './compiled';
import { oracleOf, type Oracle } from './oracle';
import { cases, RUNS, type Case } from './systems';

/** What still matters by trying every pair of completions, in the order of the questions. */
function mattering(oracle: Oracle, { input }: Case, answers: Answers): readonly string[] {
  const relevant = new Set(oracle.rules.flatMap((rule) => oracle.relevant(rule, answers)));
  return input.questions.flatMap(({ id }) => (relevant.has(id) ? [id] : []));
}

test('CHECK-4 a question still matters if and only if two completions that differ in it alone give different outcomes', () => {
  fc.assert(
    fc.property(cases, (piece) => {
      const { input, answers, strange, declined } = piece;
      const oracle = oracleOf(input);
      const line = compiled(input);
      for (const said of [{}, answers, strange]) {
        const open = mattering(oracle, piece, said);
        expect(stillMatters(line, said, [])).toEqual(open);
        expect(stillMatters(line, said, declined)).toEqual(open.filter((id) => !declined.includes(id)));
        for (const rule of oracle.rules) {
          const relevant = oracle.relevant(rule, said);
          expect(questionsOpenFor(line, said, [], rule)).toEqual(relevant);
          const isDeclined = (id: string): boolean => declined.includes(id);
          const askedFirst = [...relevant.filter((id) => !isDeclined(id)), ...relevant.filter(isDeclined)];
          expect(questionsOpenFor(line, said, declined, rule)).toEqual(askedFirst);
        }
        expect(questionsOpenFor(line, said, [], 'no-such-rule')).toEqual([]);
      }
    }),
    RUNS,
  );
});

type Talk = { readonly asked: readonly string[]; readonly answers: Answers; readonly declined: readonly string[] };

/** Asks until nothing is left; `unknown` are the questions to which the maker has no answer. */
function talk(
  line: CompiledLine,
  piece: { readonly whole: Answers; readonly unknown: readonly string[] },
  onAsk: (question: string, so: Talk) => void,
): Talk {
  let so: Talk = { asked: [], answers: {}, declined: [] };
  for (let next = nextQuestion(line, so.answers, so.declined); next !== null; next = nextQuestion(line, so.answers, so.declined)) {
    onAsk(next, so);
    expect(so.asked).not.toContain(next);
    const asked = [...so.asked, next];
    const answer = piece.unknown.includes(next) ? undefined : piece.whole[next];
    so =
      answer === undefined
        ? { ...so, asked, declined: [...so.declined, next] }
        : { ...so, asked, answers: { ...so.answers, [next]: answer } };
  }
  return so;
}

test('CHECK-5 each question asked is the first that matters and whose gate is open, or kept shut only by what was declined', () => {
  fc.assert(
    fc.property(cases, (piece) => {
      const oracle = oracleOf(piece.input);
      const line = compiled(piece.input);
      for (const unknown of [[], piece.declined]) {
        talk(line, { whole: piece.whole, unknown }, (question, { answers, declined }) => {
          const mayBeAsked = (id: string): boolean =>
            oracle.gateOf(id, answers) === 'yes' ||
            (oracle.gateOf(id, answers) === 'open' && oracle.gateRestsOn(id, answers).every((gate) => declined.includes(gate)));
          const candidates = mattering(oracle, piece, answers).filter((id) => !declined.includes(id) && mayBeAsked(id));
          expect(question).toBe(candidates[0]);
        });
      }
    }),
    RUNS,
  );
});

test('CHECK-6 asking to the end gives the outcome of full knowledge, in no more steps than there are questions', () => {
  fc.assert(
    fc.property(cases, ({ input, whole }) => {
      const oracle = oracleOf(input);
      const line = compiled(input);
      const { asked, answers } = talk(line, { whole, unknown: [] }, () => undefined);
      expect(asked.length).toBeLessThanOrEqual(input.questions.length);
      const exact = (said: Answers): readonly unknown[] => judge(line, said, []).map((outcome) => inWords(outcome.exact));
      expect(exact(answers)).toEqual(exact(whole));
      expect(exact(answers)).toEqual(oracle.rules.map((rule) => oracle.truthOf(rule, whole)));
      expect(exact(answers)).not.toContain('open');
    }),
    RUNS,
  );
});

test('CHECK-7 with questions declined the asking still ends, and every open rule rests on declined questions only', () => {
  fc.assert(
    fc.property(cases, ({ input, whole, declined: unknown }) => {
      const oracle = oracleOf(input);
      const line = compiled(input);
      const { answers, declined } = talk(line, { whole, unknown }, () => undefined);
      for (const { id, exact, status } of judge(line, answers, declined)) {
        if (exact !== UNKNOWN) continue;
        expect(status).toBe('treat-as-applying');
        expect(declined).toEqual(expect.arrayContaining([...oracle.relevant(id, answers)]));
        expect(oracle.relevant(id, answers)).not.toEqual([]);
      }
    }),
    RUNS,
  );
});
