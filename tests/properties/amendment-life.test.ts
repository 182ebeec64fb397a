import fc from 'fast-check';
import { expect, test } from 'vitest';
import type { AccountId } from '@/lib/access/domain/actor';
import {
  AUTHOR_ACTS,
  judgeAct,
  mayModeratorsRead,
  type Amendment,
  type AmendmentId,
  type AmendmentState,
  type AuthorAct,
} from '@/lib/regions/domain/amendment';
import { approvalsNeeded, judgeApproval, type ApprovalOutcome, type Decision } from '@/lib/regions/domain/approval';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { aLimit, aSheet } from '../builders/small-world';

const PEOPLE = ['ida', 'mo', 'ada'] as const;
const who = (name: string): AccountId => name as AccountId;
const AT = new Date('2026-12-01T10:00:00Z');
const FIRST = aSheet('xa');

type Written = { amendment: Amendment; document: Sheet; decisions: Decision[]; was: AmendmentState[] };
type Edition = { readonly number: number; readonly from: AmendmentId | null; readonly sheet: Sheet };

/** A press in memory: what the use cases do, with nothing but the rules of the domain between them and an edition. */
class Press {
  readonly editions: Edition[] = [{ number: 1, from: null, sheet: FIRST }];
  readonly written: Written[] = [];

  get inUse(): number {
    return this.editions.length;
  }

  begin(author: string, document: Sheet): void {
    const id = `amendment-${String(this.written.length)}` as AmendmentId;
    const amendment: Amendment = {
      id,
      region: 'xa',
      authorId: who(author),
      state: 'draft',
      version: 1,
      baseNumber: this.inUse,
      summary: '',
      intended: {},
      madeAt: AT,
      changedAt: AT,
      sentAt: null,
      openedBy: null,
      openedAt: null,
      editionNumber: null,
    };
    this.written.push({ amendment, document, decisions: [], was: ['draft'] });
  }

  private step(one: Written, state: AmendmentState, more: Partial<Amendment> = {}): void {
    one.amendment = { ...one.amendment, ...more, state, version: one.amendment.version + 1 };
    one.was.push(state);
  }

  author(one: Written, person: string, act: AuthorAct): void {
    const judged = judgeAct(one.amendment, who(person), act);
    if (!judged.ok) return;
    if (act === 'save') one.document = { ...one.document, text: `${one.document.text} More.` };
    const more = act === 'send' ? { sentAt: AT } : act === 'carry-over' ? { baseNumber: this.inUse } : {};
    this.step(one, judged.value, more);
  }

  decide(one: Written, person: string, kind: 'hold' | 'release' | 'send-back'): void {
    const judged = judgeAct(one.amendment, who(person), kind);
    if (!judged.ok) return;
    one.decisions.push({ kind, version: one.amendment.version, by: who(person), reason: 'Said.', at: AT });
    this.step(one, judged.value);
  }

  approve(one: Written, person: string, version: number): void {
    const needed = approvalsNeeded(this.sheetOf(one), one.document);
    const judged = judgeApproval(one.amendment, { by: who(person), version, inUse: this.inUse, needed, decisions: one.decisions });
    if (judged.ok) this.carryOut(one, person, judged.value);
  }

  private sheetOf({ amendment }: Written): Sheet | null {
    return this.editions.find(({ number }) => number === amendment.baseNumber)?.sheet ?? null;
  }

  private carryOut(one: Written, person: string, approved: ApprovalOutcome): void {
    const kinds = { 'once-approved': 'approve-once', 'in-use': 'approve', 'refused-stale': 'refuse-stale' } as const;
    const { version } = one.amendment;
    one.decisions.push({ kind: kinds[approved.outcome], version, by: who(person), reason: null, at: AT });
    if (approved.outcome === 'in-use') {
      this.editions.push({ number: approved.edition, from: one.amendment.id, sheet: one.document });
      this.step(one, 'in-use', { editionNumber: approved.edition });
      return;
    }
    this.step(one, approved.outcome);
  }
}

/** Written out a second time, by hand: from which state to which an amendment can ever come. */
const STEPS = new Set(
  [
    'draft>draft draft>sent draft>withdrawn',
    'sent>draft sent>withdrawn sent>held sent>sent-back sent>once-approved sent>in-use sent>refused-stale',
    'held>draft held>withdrawn held>sent held>sent-back',
    'sent-back>sent-back sent-back>sent sent-back>withdrawn sent-back>draft',
    'once-approved>draft once-approved>withdrawn once-approved>held once-approved>sent-back once-approved>in-use once-approved>refused-stale',
    'refused-stale>refused-stale refused-stale>withdrawn refused-stale>draft',
    'withdrawn>draft',
  ].flatMap((line) => line.split(' ')),
);

/** The approvals that stand behind what is in use: those given since anything else was last done to it. */
function approversOf({ decisions }: Written): readonly string[] {
  const last = decisions.at(-1);
  const before = decisions.at(-2);
  const isSecond = before?.kind === 'approve-once' && last !== undefined && before.version === last.version - 1;
  return [...(isSecond ? [before.by] : []), ...(last === undefined ? [] : [last.by])];
}

/** What must be true of all that happened. */
function hold(press: Press): void {
  expect(press.editions.map(({ number }) => number)).toEqual(press.editions.map((_, index) => index + 1));
  for (const one of press.written) {
    for (const [index, state] of one.was.slice(1).entries()) expect(STEPS).toContain(`${one.was[index] ?? ''}>${state}`);
    expect(one.decisions.map(({ by }) => by)).not.toContain(one.amendment.authorId);
    expect((one.amendment.state === 'in-use') === (one.amendment.editionNumber !== null)).toBe(true);
    if (one.decisions.length === 0 && one.amendment.sentAt === null) expect(mayModeratorsRead(one.amendment)).toBe(false);
  }
  for (const { number, from, sheet } of press.editions.slice(1)) {
    const sources = press.written.filter(({ amendment }) => amendment.editionNumber === number);
    expect(sources.map(({ amendment }) => amendment.id)).toEqual([from]);
    const [source] = sources;
    if (source === undefined) continue;
    expect(source.document).toBe(sheet);
    expect(source.amendment.baseNumber).toBe(number - 1);
    const approvers = new Set(approversOf(source));
    const before = press.editions[number - 2]?.sheet ?? null;
    expect(approvers.size).toBeGreaterThanOrEqual(approvalsNeeded(before, sheet));
    expect(approvers).not.toContain(source.amendment.authorId);
  }
}

const person = fc.constantFrom(...PEOPLE);
const place = fc.nat(2);
const document = fc.constantFrom<Sheet>(
  { ...FIRST, text: 'Other words.' },
  { ...FIRST, rules: [...FIRST.rules, aLimit('xa-pb', 2)] },
  { ...FIRST, rules: FIRST.rules.map((rule) => ({ ...rule, firm: true })) },
);

type Move = (press: Press) => void;
const on = (at: number, press: Press, move: (one: Written) => void): void => {
  const one = press.written[press.written.length - 1 - at];
  if (one !== undefined) move(one);
};

const move: fc.Arbitrary<Move> = fc.oneof(
  {
    weight: 2,
    arbitrary: fc.tuple(person, document).map(([by, sheet]): Move => (press) => {
      press.begin(by, sheet);
    }),
  },
  {
    weight: 3,
    arbitrary: fc.tuple(place, person, fc.constantFrom(...AUTHOR_ACTS)).map(([at, by, act]): Move => (press) => {
      on(at, press, (one) => {
        press.author(one, by, act);
      });
    }),
  },
  {
    // Its own author, who alone can: or most sequences would end at a draft.
    weight: 4,
    arbitrary: place.map((at): Move => (press) => {
      on(at, press, (one) => {
        press.author(one, one.amendment.authorId, 'send');
      });
    }),
  },
  {
    weight: 2,
    arbitrary: fc.tuple(place, person, fc.constantFrom('hold', 'release', 'send-back')).map(([at, by, kind]): Move => (press) => {
      on(at, press, (one) => {
        press.decide(one, by, kind);
      });
    }),
  },
  {
    // Somebody who may: the others are tried above and below.
    weight: 6,
    arbitrary: fc.tuple(place, fc.nat(1)).map(([at, which]): Move => (press) => {
      on(at, press, (one) => {
        const others = PEOPLE.filter((name) => one.amendment.authorId !== name);
        press.approve(one, others[which] ?? 'mo', one.amendment.version);
      });
    }),
  },
  {
    weight: 3,
    arbitrary: fc.tuple(place, person, fc.constantFrom(0, 0, 0, 1)).map(([at, by, behind]): Move => (press) => {
      on(at, press, (one) => {
        press.approve(one, by, one.amendment.version - behind);
      });
    }),
  },
);

test('REG-59 REG-51 S27 no sequence of acts lets an author approve their own, skips a number or makes an edition without its source', () => {
  let editions = 0;
  let twice = 0;
  let refused = 0;
  fc.assert(
    fc.property(fc.array(move, { minLength: 5, maxLength: 60, size: 'max' }), (moves) => {
      const press = new Press();
      for (const one of moves) one(press);
      // All that ever happened is kept, so that one look at the end sees every step.
      hold(press);
      editions += press.editions.length - 1;
      twice += press.written.filter((one) => one.amendment.state === 'in-use' && approversOf(one).length === 2).length;
      refused += press.written.filter(({ was }) => was.includes('refused-stale')).length;
    }),
    { numRuns: 1000, seed: 20261201 },
  );
  // Not true of nothing: all three ends were reached, many times.
  console.log(`${String(editions)} editions, ${String(twice)} by two moderators, ${String(refused)} refused stale`);
  expect(Math.min(editions, twice, refused)).toBeGreaterThan(100);
});
