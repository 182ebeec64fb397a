import fc from 'fast-check';
import { expect, test } from 'vitest';
import { exactOf, judge, kleeneOf, type Outcome } from '@/lib/checks/domain/judge';
import { knowledgeOf } from '@/lib/checks/domain/knowledge';
import type { EngineRule, LineInput } from '@/lib/checks/domain/line';
import { NO, YES } from '@/lib/kernel/tri';
import type { Condition } from '@/lib/regions/domain/condition';
import { compiled } from './compiled';
import { cases, Draws, RUNS, type Case } from './systems';

const exception = (target: string, when: Condition): EngineRule => ({
  id: 'the-exception',
  region: 'top',
  kind: 'excepts',
  targets: [target],
  alongside: [],
  when,
  from: null,
  to: null,
  order: 0,
  firm: false,
});

const withTop = (input: LineInput, rules: readonly EngineRule[]): LineInput => ({
  ...input,
  layers: [...input.layers, { region: 'top', rules, terms: [] }],
});

const activeRules = (input: LineInput): readonly EngineRule[] => {
  const ids = new Set(compiled(input).rules.map(({ id }) => id));
  return input.layers.flatMap(({ rules }) => rules.filter(({ id }) => ids.has(id)));
};

/** A rule that may be attacked from above, if the line has one. Most lines must, or nothing is tested. */
class Targets {
  private found = 0;

  of({ input, draws }: Case): EngineRule | undefined {
    const target = new Draws(draws).from(activeRules(input).filter(({ firm }) => !firm));
    if (target !== undefined) this.found += 1;
    return target;
  }

  expectMany(): void {
    expect(this.found).toBeGreaterThan(0.9 * RUNS.numRuns);
  }
}

const without = (outcomes: readonly Outcome[], id: string): readonly Outcome[] => outcomes.filter((outcome) => outcome.id !== id);

test('CHECK-9 an exception that cannot hold changes nothing', () => {
  const targets = new Targets();
  fc.assert(
    fc.property(cases, (piece) => {
      const { input, answers, declined } = piece;
      const target = targets.of(piece);
      if (target === undefined) return;
      const question = input.questions.find(({ kind }) => kind === 'yesno')?.id;
      const atoms: readonly Condition[] = question === undefined ? [false] : [{ question, is: true }, { not: { question, is: true } }];
      for (const when of [false, { all: atoms }]) {
        const outcomes = judge(compiled(withTop(input, [exception(target.id, when)])), answers, declined);
        expect(without(outcomes, 'the-exception')).toEqual(judge(compiled(input), answers, declined));
      }
    }),
    RUNS,
  );
  targets.expectMany();
});

test('CHECK-9 an exception that always holds silences its target, whatever else is known', () => {
  const targets = new Targets();
  fc.assert(
    fc.property(cases, (piece) => {
      const { input, answers, declined } = piece;
      const target = targets.of(piece);
      if (target === undefined) return;
      const outcomes = judge(compiled(withTop(input, [exception(target.id, true)])), answers, declined);
      const silenced = outcomes.find(({ id }) => id === target.id);
      expect(silenced).toMatchObject({ status: 'does-not-apply', exact: NO, because: [] });
      expect(silenced?.silencedBy).toContain('the-exception');
    }),
    RUNS,
  );
  targets.expectMany();
});

test('CHECK-9 an exception to an exception that always holds brings the target back', () => {
  const targets = new Targets();
  fc.assert(
    fc.property(cases, (piece) => {
      const { input, answers, declined } = piece;
      const target = targets.of(piece);
      if (target === undefined) return;
      const second = { ...exception('the-exception', true), id: 'the-second', order: 1 };
      const outcomes = judge(compiled(withTop(input, [exception(target.id, true), second])), answers, declined);
      expect(without(without(outcomes, 'the-exception'), 'the-second')).toEqual(judge(compiled(input), answers, declined));
    }),
    RUNS,
  );
  targets.expectMany();
});

test('CHECK-9 a line whose last layer is empty is the line of the layer above, and what is excepted might as well not stand there', () => {
  fc.assert(
    fc.property(cases, ({ input, answers, declined }) => {
      const said = (line: LineInput): readonly Outcome[] => judge(compiled(line), answers, declined);
      expect(said(withTop(input, []))).toEqual(said(input));
      const removed = input.layers.map((layer) => ({ ...layer, rules: layer.rules.filter(({ id }) => !input.except.includes(id)) }));
      expect(said({ ...input, layers: removed, except: [] })).toEqual(said(input));
      const top = input.layers.at(-1)?.rules.map(({ id }) => id) ?? [];
      const emptied = input.layers.map((layer, at) => (at === input.layers.length - 1 ? { ...layer, rules: [] } : layer));
      expect(said({ ...input, except: [...input.except, ...top] })).toEqual(said({ ...input, layers: emptied }));
    }),
    RUNS,
  );
});

/** The same condition in other words: De Morgan's laws, double negation, nesting. */
function reworded(condition: Condition, draws: Draws): Condition {
  if (typeof condition === 'boolean') return draws.chance(50) ? { not: !condition } : condition;
  if ('not' in condition) return { not: reworded(condition.not, draws) };
  if ('all' in condition) {
    const parts = condition.all.map((part) => reworded(part, draws));
    return draws.chance(50)
      ? { not: { any: parts.map((part) => ({ not: part })) } }
      : { all: [{ all: parts.slice(0, 1) }, ...parts.slice(1)] };
  }
  if ('any' in condition) {
    const parts = condition.any.map((part) => reworded(part, draws));
    return draws.chance(50)
      ? { not: { all: parts.map((part) => ({ not: part })) } }
      : { any: [...parts.slice(0, 1), { any: parts.slice(1) }] };
  }
  return draws.chance(30) ? { not: { not: condition } } : condition;
}

test('CHECK-10 other words for the same condition change neither the Kleene value nor the exact status', () => {
  fc.assert(
    fc.property(cases, ({ input, answers, whole, draws }) => {
      const dealt = new Draws(draws);
      const layers = input.layers.map(({ region, rules, terms }) => ({
        region,
        rules: rules.map((rule) => ({ ...rule, when: reworded(rule.when, dealt) })),
        terms: terms.map((term) => ({ ...term, when: reworded(term.when, dealt) })),
      }));
      const [line, other] = [compiled(input), compiled({ ...input, layers })];
      for (const said of [answers, whole]) {
        expect(kleeneOf(other, knowledgeOf(other, said))).toEqual(kleeneOf(line, knowledgeOf(line, said)));
        expect(exactOf(other, knowledgeOf(other, said))).toEqual(exactOf(line, knowledgeOf(line, said)));
      }
      expect(other.diagram.size).toBe(line.diagram.size);
      const effective = exactOf(line, knowledgeOf(line, whole));
      expect(effective.every((status) => status === YES || status === NO)).toBe(true);
    }),
    RUNS,
  );
});

test('CHECK-10 in one line, both wordings of a condition are one node', () => {
  const seen = { conditions: 0, reworded: 0 };
  fc.assert(
    fc.property(cases, ({ input, draws }) => {
      const dealt = new Draws(draws);
      const plain = { kind: 'adds', targets: [], alongside: [], from: null, to: null, firm: false } as const;
      const layers = input.layers.map((layer) => ({
        ...layer,
        rules: layer.rules.flatMap((rule): readonly EngineRule[] => {
          const other = reworded(rule.when, dealt);
          seen.conditions += 1;
          if (JSON.stringify(other) !== JSON.stringify(rule.when)) seen.reworded += 1;
          return [
            { ...rule, ...plain },
            { ...rule, ...plain, id: `${rule.id} in other words`, when: other },
          ];
        }),
      }));
      const nodes = new Map(compiled({ ...input, layers, except: [] }).rules.map(({ id, node }) => [id, node]));
      for (const [id, node] of nodes) expect(node).toBe(nodes.get(id.replace(' in other words', '')));
    }),
    RUNS,
  );
  expect(seen.reworded / seen.conditions).toBeGreaterThan(0.5);
});
