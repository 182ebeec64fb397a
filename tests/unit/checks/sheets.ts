import type { Finding, SheetCheck } from '@/lib/checks/domain/finding';
import type { Proposal } from '@/lib/checks/domain/proposal-lines';
import type { Question } from '@/lib/checks/domain/questions';
import { checkSheet } from '@/lib/checks/domain/sheet-checks';
import type { Condition } from '@/lib/regions/domain/condition';
import type { Citation, Rule, Term } from '@/lib/regions/domain/rule';
import type { Sheet } from '@/lib/regions/domain/sheet';
import type { Trial } from '@/lib/regions/domain/trial';
import { choice, day, yesno } from './lines';

export const TODAY = day('2026-12-01');

export const quoted: Citation = {
  source: 'act',
  locator: 'Section 2',
  passage: 'Ware shall be marked.',
  passageLang: 'en',
  standing: 'law',
  evidence: 'read',
};

/** A rule of the place "qq" that was read and quoted, in force always; the rest as given. */
export const sheetRule = (id: string, when: Condition, rest: Partial<Rule> = {}): Rule => ({
  id,
  region: 'qq',
  kind: 'adds',
  targets: [],
  alongside: [],
  when,
  from: null,
  to: null,
  order: 1,
  firm: false,
  strength: 'must',
  standing: 'law',
  title: 'Mark the ware',
  says: 'Mark it under the foot.',
  payload: { topic: 'other' },
  sources: [quoted],
  facts: [],
  lookAgainBy: day('2027-12-01'),
  ...rest,
});

export const sheetTerm = (id: string, when: Condition, rest: Partial<Term> = {}): Term => ({
  id,
  region: 'qq',
  name: id,
  says: 'A kind of ware.',
  category: false,
  when,
  from: null,
  to: null,
  sources: [quoted],
  facts: [],
  ...rest,
});

export const aTrial = (id: string, expected: Trial['expected'], rest: Partial<Trial> = {}): Trial => ({
  id,
  title: 'A mug',
  on: TODAY,
  answers: { a: true },
  declined: [],
  expected,
  ...rest,
});

export const aSheet = (rules: readonly Rule[], rest: Partial<Sheet> = {}): Sheet => ({
  code: 'qq',
  name: 'Quarn',
  kind: 'country',
  languages: ['en'],
  memberships: [],
  text: 'What is known of Quarn.',
  textFacts: [],
  authorities: [],
  accreditation: [],
  gaps: [],
  sources: [{ id: 'act', title: 'Ware Act', publisher: 'Parliament of Quarn', seenOn: day('2026-11-01') }],
  terms: [],
  rules,
  trials: [],
  leftOut: [],
  ...rest,
});

/** The place "vv" above: "qq" is part of it. */
export const above = (rules: readonly Rule[], rest: Partial<Sheet> = {}): Sheet =>
  aSheet(
    rules.map((rule) => ({ ...rule, region: 'vv' })),
    { code: 'vv', name: 'Vale', kind: 'bloc', ...rest },
  );
export const partOf = (parent: string): Sheet['memberships'] => [{ parent, from: null, to: null, except: [] }];

/** Asked in this order; "behind" only if "form" is a cup. */
export const QUESTIONS: readonly Question[] = [
  choice('form', ['cup', 'plate', 'bowl']),
  { ...yesno('behind'), askIf: { question: 'form', in: ['cup'] } },
  { ...yesno('shut'), askIf: { question: 'form', in: [] } },
  yesno('a'),
  yesno('b'),
  { id: 'depth', topic: 'form', kind: 'amount', unit: 'mm' },
];

type Others = Partial<Omit<Proposal, 'proposed'>> & { readonly around?: readonly Sheet[] };

/** What the checks find in a proposed sheet. Without a base given it is based on itself: only what the sheet is, no change, is judged. */
export function found(proposed: Sheet, { around = [], ...others }: Others = {}): readonly Finding[] {
  return checkSheet({
    proposed,
    base: proposed,
    sheets: new Map([proposed, ...around].map((sheet) => [sheet.code, sheet])),
    memberships: new Map([proposed, ...around].map(({ code, memberships }) => [code, memberships])),
    on: TODAY,
    questions: QUESTIONS,
    ...others,
  });
}

/** Each finding of one check as "kind list/id/field". */
export const told = (findings: readonly Finding[], check: SheetCheck): readonly string[] =>
  findings.filter((finding) => finding.check === check).map(({ kind, at }) => `${kind} ${at.list}/${at.id}/${at.field}`);

export const isA: Condition = { question: 'a', is: true };
export const notA: Condition = { question: 'a', is: false };
export const isB: Condition = { question: 'b', is: true };
export const isCup: Condition = { question: 'form', is: 'cup' };
