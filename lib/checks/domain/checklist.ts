import { addMonths, type CalendarDate } from '@/lib/kernel/calendar-date';
import { NO } from '@/lib/kernel/tri';
import type { RegionLine } from '@/lib/regions/domain/line';
import { isInForce } from '@/lib/regions/domain/rule';
import type { Contact, Sheet } from '@/lib/regions/domain/sheet';
import { tellRule, type ToldRule } from '@/lib/regions/domain/told-rule';
import { judge, statusOfTerm, type Outcome, type Status } from './judge';
import type { Answers } from './knowledge';
import type { CompiledLine } from './line';

/** The sheets a place is read from on a day, general to local, the base layer first, with the engine's form of them. */
export type LoadedLine = {
  readonly code: string;
  readonly line: RegionLine;
  readonly layers: readonly { readonly sheet: Sheet; readonly edition: number; readonly hash: string }[];
  readonly compiled: CompiledLine;
};

export type JudgedRule = Pick<
  ToldRule,
  'id' | 'region' | 'topic' | 'strength' | 'standing' | 'evidence' | 'title' | 'says' | 'payload' | 'sources'
> & {
  readonly status: Status;
  readonly because: Outcome['because'];
  readonly silencedBy: readonly string[];
};

export type ToldContact = Contact & { readonly region: string };

/** The checklist of one piece for one place. */
export type RegionChecklist = {
  readonly code: string;
  readonly line: readonly string[];
  readonly editions: Readonly<Record<string, number>>;
  readonly rules: readonly JudgedRule[];
  readonly notInherited: RegionLine['except'];
  readonly coming: readonly { readonly id: string; readonly title: string; readonly from: CalendarDate }[];
  readonly categories: readonly { readonly term: string; readonly name: string; readonly region: string; readonly possible: boolean }[];
  readonly authorities: readonly ToldContact[];
  readonly accreditation: readonly ToldContact[];
};

/** Months a change is announced ahead. */
const AHEAD = 12;

/** Judges one piece for one place on a day. Pure: the same sheets, answers and day give the same checklist, byte for byte. */
export function checklistOf(loaded: LoadedLine, answers: Answers, declined: readonly string[], on: CalendarDate): RegionChecklist {
  const { code, line, layers, compiled } = loaded;
  const told = new Map(layers.flatMap(({ sheet }) => sheet.rules.map((rule) => [rule.id, tellRule(rule, sheet.sources)])));
  const local = [...layers].reverse();
  return {
    code,
    line: line.layers,
    editions: Object.fromEntries(layers.filter(({ sheet }) => sheet.kind !== 'base').map(({ sheet, edition }) => [sheet.code, edition])),
    rules: judge(compiled, answers, declined).flatMap((outcome) => judgedRule(told.get(outcome.id), outcome)),
    notInherited: line.except,
    coming: comingOf(layers, line, on),
    categories: layers.flatMap(({ sheet }) => categoriesOf(sheet, compiled, answers, on)),
    authorities: local.flatMap(({ sheet }) => contactsOf(sheet, sheet.authorities)),
    accreditation: local.flatMap(({ sheet }) => contactsOf(sheet, sheet.accreditation)),
  };
}

function judgedRule(rule: ToldRule | undefined, { status, because, silencedBy }: Outcome): readonly JudgedRule[] {
  if (rule === undefined) return [];
  const { id, region, topic, strength, standing, evidence, title, says, payload, sources } = rule;
  return [{ id, region, topic, strength, standing, evidence, title, says, status, because, silencedBy, payload, sources }];
}

function comingOf(layers: LoadedLine['layers'], line: RegionLine, on: CalendarDate): RegionChecklist['coming'] {
  const until = addMonths(on, AHEAD);
  const excepted = new Set(line.except.map(({ rule }) => rule));
  return layers
    .flatMap(({ sheet }) => sheet.rules)
    .flatMap(({ id, title, from }) => (from !== null && on < from && from <= until && !excepted.has(id) ? [{ id, title, from }] : []))
    .sort((a, b) => (a.from === b.from ? (a.id < b.id ? -1 : 1) : a.from < b.from ? -1 : 1));
}

function categoriesOf(sheet: Sheet, compiled: CompiledLine, answers: Answers, on: CalendarDate): RegionChecklist['categories'] {
  return sheet.terms
    .filter((term) => term.category && isInForce(term, on))
    .map(({ id, name, region }) => ({ term: id, name, region, possible: statusOfTerm(compiled, answers, id) !== NO }));
}

const contactsOf = (sheet: Sheet, contacts: readonly Contact[]): readonly ToldContact[] =>
  contacts.map(({ name, url, role, evidence }) => ({ name, url, role, region: sheet.code, evidence }));
