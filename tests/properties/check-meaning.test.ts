import fc from 'fast-check';
import { expect, test } from 'vitest';
import { judge } from '@/lib/checks/domain/judge';
import type { EngineRule, EngineTerm, Layer, LineInput } from '@/lib/checks/domain/line';
import { compareMeaning, type RuleMeaning } from '@/lib/checks/domain/meaning';
import type { Condition, Threshold } from '@/lib/regions/domain/condition';
import { compiled } from './compiled';
import { oracleOf, type Oracle } from './oracle';
import { cases, Draws, RUNS } from './systems';

/** The same condition with every name in it changed, or with every bound. */
function rewritten(when: Condition, term: (id: string) => string, bound: (at: Threshold) => Threshold): Condition {
  if (typeof when === 'boolean') return when;
  if ('all' in when) return { all: when.all.map((part) => rewritten(part, term, bound)) };
  if ('any' in when) return { any: when.any.map((part) => rewritten(part, term, bound)) };
  if ('not' in when) return { not: rewritten(when.not, term, bound) };
  if ('term' in when) return { term: term(when.term) };
  if ('lt' in when) return { ...when, lt: bound(when.lt) };
  if ('le' in when) return { ...when, le: bound(when.le) };
  if ('gt' in when) return { ...when, gt: bound(when.gt) };
  return 'ge' in when ? { ...when, ge: bound(when.ge) } : when;
}

const same = <T>(one: T): T => one;
const RAISED: Readonly<Record<string, number>> = { mm: 10, cm: 1, mL: 1000, L: 1, kg: 1, g: 100, EUR: 7, DKK: 7 };
const raised = ({ value, unit }: Threshold): Threshold => ({ value: value + (RAISED[unit] ?? 1), unit });

/** Another condition, which may well mean the same. */
function changed(when: Condition, others: readonly Condition[], draws: Draws): Condition {
  const other = draws.from(others) ?? true;
  const ways: readonly [Condition, ...Condition[]] = [
    rewritten(when, same, raised),
    { not: { not: when } },
    { any: [when, { all: [when, other] }] },
    { all: [when, other] },
    { any: [when, other] },
    { not: when },
    other,
  ];
  return draws.from(ways);
}

/** The same line with some rules and terms changed, dropped or let loose on others. */
function amended(input: LineInput, draws: Draws): LineInput {
  const whens = input.layers.flatMap(({ rules }) => rules.map(({ when }) => when)).filter((when) => !JSON.stringify(when).includes('term'));
  const amendedRule = (rule: EngineRule): readonly EngineRule[] => {
    if (draws.chance(10)) return [];
    if (draws.chance(15)) return [{ ...rule, targets: rule.targets.slice(1) }];
    if (draws.chance(15)) return [{ ...rule, alongside: [] }];
    return draws.chance(40) ? [{ ...rule, when: changed(rule.when, whens, draws) }] : [rule];
  };
  const amendedTerm = (term: EngineTerm): EngineTerm => (draws.chance(40) ? { ...term, when: changed(term.when, whens, draws) } : term);
  const layers = input.layers.map((layer) => ({ ...layer, rules: layer.rules.flatMap(amendedRule), terms: layer.terms.map(amendedTerm) }));
  return { ...input, layers };
}

const marked = (id: string): string => `${id}-later`;

/** Only what counts on the day: the oracle cuts amounts at every bound it is shown. */
function activeOnly(input: LineInput): LineInput {
  const holds = ({ from, to }: Pick<EngineTerm, 'from' | 'to'>): boolean =>
    (from === null || from <= input.on) && (to === null || input.on < to);
  const layers = input.layers.map(({ region, rules, terms }) => ({
    region,
    rules: rules.filter((rule) => holds(rule) && !input.except.includes(rule.id)),
    terms: terms.filter(holds),
  }));
  return { ...input, layers, except: [] };
}

/** Both versions as one set of rules, those of the later one under other names, so that every world is a world of both. */
function together(...versions: readonly [before: LineInput, after: LineInput]): Oracle {
  const [before, after] = [activeOnly(versions[0]), activeOnly(versions[1])];
  const renamed = ({ region, rules, terms }: Layer): Layer => ({
    region,
    rules: rules.map((rule) => ({
      ...rule,
      id: marked(rule.id),
      targets: rule.targets.map(marked),
      alongside: rule.alongside.map(marked),
      when: rewritten(rule.when, marked, same),
    })),
    terms: terms.map((term) => ({ ...term, id: marked(term.id), when: rewritten(term.when, marked, same) })),
  });
  return oracleOf({ ...before, layers: [...before.layers, ...after.layers.map(renamed)] });
}

const compared = (before: LineInput, after: LineInput): readonly RuleMeaning[] => {
  const meanings = compareMeaning({ before, after });
  if (!meanings.ok) throw new Error(`A sound line was refused: ${JSON.stringify(meanings.error)}`);
  return meanings.value;
};

const hasPlaces = ({ questions }: LineInput): boolean => questions.some(({ kind }) => kind === 'region');

test('CHECK-80 CHECK-81 what is told as the same agrees in every world, all else differs in as large a share as is told', () => {
  fc.assert(
    fc.property(cases, ({ input, draws }) => {
      const after = amended(input, new Draws(draws));
      const oracle = together(input, after);
      const meanings = compared(input, after);
      const ids = new Set(oracle.rules.map((id) => id.replace(marked(''), '')));
      expect(new Set(meanings.map(({ rule }) => rule))).toEqual(ids);
      for (const { rule, kind, share } of meanings) {
        const differing = oracle.differing(rule, marked(rule));
        const [was, is] = [oracle.rules.includes(rule), oracle.rules.includes(marked(rule))];
        expect(kind).toBe(was && is ? (differing === 0 ? 'same' : 'changed') : is ? 'added' : 'withdrawn');
        // Places are worlds one by one and share cells, so there only none and some can be held together.
        if (hasPlaces(input)) expect(share.cases === '0').toBe(differing === 0);
        else expect(BigInt(share.cases) * BigInt(oracle.worlds)).toBe(BigInt(differing) * BigInt(share.of));
      }
    }),
    RUNS,
  );
});

test('CHECK-82 an example piece really differs, judged by both versions and by the oracle', () => {
  const told = { examples: 0, without: 0 };
  fc.assert(
    fc.property(cases, ({ input, draws }) => {
      const after = amended(input, new Draws(draws));
      const oracle = together(input, after);
      const lines = { before: compiled(input), after: compiled(after) };
      for (const { rule, kind, example, share } of compared(input, after)) {
        expect(example !== null && share.cases === '0').toBe(false);
        if (example === null) {
          // Some worlds have no answer of their own: a member of a bloc that no list names.
          expect(kind === 'same' || share.cases === '0' || hasPlaces(input)).toBe(true);
          told.without += kind === 'changed' ? 1 : 0;
          continue;
        }
        told.examples += 1;
        expect(example.before).not.toBe(example.after);
        const truthOf = (id: string): string | null => (oracle.rules.includes(id) ? oracle.truthOf(id, example.answers) : null);
        const inWords = (status: string | null): string | null => (status === null ? null : status === 'does-not-apply' ? 'no' : 'yes');
        expect([inWords(example.before), inWords(example.after)]).toEqual([truthOf(rule), truthOf(marked(rule))]);
        for (const side of ['before', 'after'] as const) {
          const judged = judge(lines[side], example.answers, []).find(({ id }) => id === rule);
          expect(judged?.status ?? null).toBe(example[side]);
        }
      }
    }),
    RUNS,
  );
  expect(told.examples).toBeGreaterThan(500);
  expect(told.without).toBeLessThan(told.examples / 20);
});
