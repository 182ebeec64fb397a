import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { regionLine } from '@/lib/regions/domain/line';
import type { Condition } from '@/lib/regions/domain/condition';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { readCondition, type ReadFault } from './condition-reading';
import { fault, inRule, inTerm, inTrial, type Finding, type FindingAt, type FindingList } from './finding';
import { layersOf, worldAfter, type Proposal, type World } from './proposal-lines';

/** C1: every id leads somewhere and stands once, and every test fits its question. Terms are looked up whatever their dates. */
export function checkNames(proposal: Proposal, days: readonly CalendarDate[]): readonly Finding[] {
  const world = worldAfter(proposal);
  const { proposed } = proposal;
  const above = sheetsOfLine(world, proposed.code, days);
  return [
    ...repeatedIds(proposed),
    ...conditionFaults(proposed, above, proposal),
    ...rulesElsewhere(proposed, world),
    ...membershipFaults(proposed, world, days),
  ];
}

/** Every sheet that the place is read from on one of the days, its own included. */
export function sheetsOfLine(world: World, code: string, days: readonly CalendarDate[]): readonly Sheet[] {
  const codes = new Set(days.flatMap((on) => layersOf(world, code, on)));
  return [...codes].flatMap((layer) => world.sheets.get(layer) ?? []);
}

function repeatedIds(sheet: Sheet): readonly Finding[] {
  const lists: readonly (readonly [FindingList, readonly { readonly id: string }[]])[] = [
    ['rules', sheet.rules],
    ['terms', sheet.terms],
    ['sources', sheet.sources],
    ['trials', sheet.trials],
  ];
  return lists.flatMap(([list, items]) => {
    const ids = items.map(({ id }) => id);
    const twice = ids.filter((id, place) => ids.indexOf(id) !== place);
    return twice.map((id) => fault('C1', { at: { list, id, field: 'id' }, kind: 'twice', values: { id } }));
  });
}

function conditionFaults(proposed: Sheet, above: readonly Sheet[], { questions }: Proposal): readonly Finding[] {
  const terms = new Set(above.flatMap((sheet) => sheet.terms.map(({ id }) => id)));
  const scope = {
    questions,
    placeOf: new Map(questions.map(({ id }, place) => [id, place])),
    termOf: (id: string): number | null => (terms.has(id) ? 0 : null),
  };
  const faultIn = (when: Condition, at: FindingAt): readonly Finding[] => {
    const read = readCondition(when, scope);
    return read.ok ? [] : [nameFault(read.error, at)];
  };
  return [
    ...proposed.terms.flatMap(({ id, when }) => faultIn(when, inTerm(id, 'when'))),
    ...proposed.rules.flatMap(({ id, when }) => faultIn(when, inRule(id, 'when'))),
  ];
}

function nameFault({ kind, about = '' }: ReadFault, at: FindingAt): Finding {
  if (kind === 'unknown-question') return fault('C1', { at, kind, values: { question: about } });
  if (kind === 'unknown-term') return fault('C1', { at, kind, values: { term: about } });
  return fault('C1', { at, kind: 'bad-test', values: { question: about } });
}

/** A rule's id is its address, so no two sheets may share one. */
function rulesElsewhere(proposed: Sheet, { sheets }: World): readonly Finding[] {
  const owners = new Map(
    [...sheets.values()]
      .filter(({ code }) => code !== proposed.code)
      .flatMap(({ code, rules }) => rules.map(({ id }) => [id, code] as const)),
  );
  return proposed.rules.flatMap(({ id }) => {
    const region = owners.get(id);
    return region === undefined ? [] : [fault('C1', { at: inRule(id, 'id'), kind: 'rule-elsewhere', values: { id, region } })];
  });
}

function membershipFaults(proposed: Sheet, world: World, days: readonly CalendarDate[]): readonly Finding[] {
  const lineOf = (code: string): readonly string[] => days.flatMap((on) => regionLine(world.memberships, code, on).layers);
  return proposed.memberships.flatMap(({ parent, except }): readonly Finding[] => {
    const at = (field: string): FindingAt => ({ list: 'memberships', id: parent, field });
    if (!world.sheets.has(parent)) return [fault('C1', { at: at('parent'), kind: 'parent-unknown', values: { region: parent } })];
    if (parent === proposed.code || lineOf(parent).includes(proposed.code))
      return [fault('C1', { at: at('parent'), kind: 'membership-circle', values: { region: parent } })];
    const inherited = new Set(sheetsOfLine(world, parent, days).flatMap(({ rules }) => rules.map(({ id }) => id)));
    const unknown = except.filter(({ rule }) => !inherited.has(rule));
    return unknown.map(({ rule }) => fault('C1', { at: at('except'), kind: 'except-unknown', values: { rule, region: parent } }));
  });
}

/** Where an id of a compile fault stands in the sheet; the sheet itself where it is inherited. */
export function placeOfId(sheet: Sheet, id: string, field: string): FindingAt {
  if (sheet.rules.some((rule) => rule.id === id)) return inRule(id, field);
  if (sheet.terms.some((term) => term.id === id)) return inTerm(id, field);
  return sheet.trials.some((trial) => trial.id === id) ? inTrial(id, field) : { list: 'sheet', id: sheet.code, field: 'rules' };
}
