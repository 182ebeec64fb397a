import fc from 'fast-check';
import { expect, test } from 'vitest';
import { judge } from '@/lib/checks/domain/judge';
import type { AnswerValue } from '@/lib/checks/domain/knowledge';
import type { EngineRule, LineInput } from '@/lib/checks/domain/line';
import type { Question } from '@/lib/checks/domain/questions';
import { NO, YES } from '@/lib/kernel/tri';
import type { Condition, Threshold } from '@/lib/regions/domain/condition';
import { compiled } from './compiled';
import { DAYS, RUNS } from './systems';

type Asked = { readonly question: Question; readonly own: bigint; readonly units: readonly (readonly [unit: string, size: bigint])[] };

/** For each kind of amount: the units a rule may use, and the answer's own unit, in millionths of the base unit. */
const own = { id: 'size', topic: 'form' } as const;
const ASKED: readonly Asked[] = [
  {
    question: { ...own, kind: 'amount', unit: 'mm' },
    own: 1_000_000n,
    units: [
      ['mm', 1_000_000n],
      ['cm', 10_000_000n],
    ],
  },
  {
    question: { ...own, kind: 'amount', unit: 'cm' },
    own: 10_000_000n,
    units: [
      ['mm', 1_000_000n],
      ['cm', 10_000_000n],
    ],
  },
  {
    question: { ...own, kind: 'amount', unit: 'mL' },
    own: 1_000_000n,
    units: [
      ['mL', 1_000_000n],
      ['L', 1_000_000_000n],
    ],
  },
  {
    question: { ...own, kind: 'amount', unit: 'L' },
    own: 1_000_000_000n,
    units: [
      ['mL', 1_000_000n],
      ['L', 1_000_000_000n],
    ],
  },
  {
    question: { ...own, kind: 'amount', unit: 'kg' },
    own: 1_000_000n,
    units: [
      ['kg', 1_000_000n],
      ['g', 1_000n],
    ],
  },
  {
    question: { ...own, kind: 'amount', unit: 'g' },
    own: 1_000n,
    units: [
      ['kg', 1_000_000n],
      ['g', 1_000n],
    ],
  },
  { question: { ...own, kind: 'amount', unit: 'C' }, own: 1_000_000n, units: [['C', 1_000_000n]] },
  { question: { ...own, kind: 'amount', unit: 'percent' }, own: 1_000_000n, units: [['percent', 1_000_000n]] },
  { question: { ...own, kind: 'amount', unit: 'pieces' }, own: 1_000_000n, units: [['pieces', 1_000_000n]] },
  { question: { ...own, kind: 'amount', unit: 'people' }, own: 1_000_000n, units: [['people', 1_000_000n]] },
  {
    question: { ...own, kind: 'money' },
    own: 1_000_000n,
    units: [
      ['EUR', 1_000_000n],
      ['DKK', 1_000_000n],
    ],
  },
];

const rule = (id: string, when: Condition): EngineRule => ({
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
});

function lineOf(question: Question, bounds: readonly Threshold[]): LineInput {
  const rules = bounds.flatMap((bound, at) => [
    rule(`${at} lt`, { question: question.id, lt: bound }),
    rule(`${at} le`, { question: question.id, le: bound }),
    rule(`${at} gt`, { question: question.id, gt: bound }),
    rule(`${at} ge`, { question: question.id, ge: bound }),
  ]);
  return { questions: [question], layers: [{ region: 'qq', rules, terms: [] }], except: [], on: DAYS[2], places: [] };
}

/** `amount` millionths of the base unit as a decimal text in a unit of `size` millionths. All sizes are powers of ten. */
function decimal(amount: bigint, size: bigint): string {
  const places = size.toString().length - 1;
  const digits = amount.toString().padStart(places + 1, '0');
  return `${digits.slice(0, digits.length - places)}.${digits.slice(digits.length - places)}`;
}

type Bound = { readonly at: bigint; readonly unit: string; readonly threshold: Threshold };

const bounds = fc
  .record({
    asked: fc.constantFrom(...ASKED),
    places: fc.array(fc.record({ at: fc.bigInt(1n, 10_000_000_000n), unit: fc.nat(1) }), { minLength: 1, maxLength: 7 }),
  })
  .map(({ asked, places }) => ({
    asked,
    bounds: places.flatMap(({ at, unit }): readonly Bound[] => {
      const [name, size] = asked.units[unit % asked.units.length] ?? ['', 1n];
      return [{ at, unit: name, threshold: { value: Number(decimal(at, size)), unit: name } }];
    }),
  }));

/** The amount as a text, and as a number, in every currency that counts. */
function answersFor({ question, own: size }: Asked, amount: bigint): readonly AnswerValue[] {
  const text = decimal(amount, size);
  if (question.kind === 'money') return [['EUR', 'DKK'].map((currency) => ({ amount: text, currency }))];
  return [text, Number(text)];
}

const COMPARED: Readonly<Record<string, (a: bigint, b: bigint) => boolean>> = {
  lt: (a, b) => a < b,
  le: (a, b) => a <= b,
  gt: (a, b) => a > b,
  ge: (a, b) => a >= b,
};

test('CHECK-14 an amount on a threshold, a millionth under it and a millionth over it fall where they belong, in every unit', () => {
  fc.assert(
    fc.property(bounds, ({ asked, bounds: all }) => {
      const line = compiled(
        lineOf(
          asked.question,
          all.map(({ threshold }) => threshold),
        ),
      );
      for (const amount of all.flatMap(({ at }) => [at - 1n, at, at + 1n])) {
        for (const answer of answersFor(asked, amount)) {
          const wrong = judge(line, { size: answer }, []).filter(({ id, exact }) => {
            const [at = '', by = ''] = id.split(' ');
            return exact !== (COMPARED[by]?.(amount, all[Number(at)]?.at ?? 0n) === true ? YES : NO);
          });
          expect(wrong).toEqual([]);
        }
      }
    }),
    RUNS,
  );
});
