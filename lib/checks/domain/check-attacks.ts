import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { Rule } from '@/lib/regions/domain/rule';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { sheetsOfLine } from './check-names';
import { fault, inRule, remark, type Finding, type FindingKind } from './finding';
import { regionsBelow, worldAfter, type Proposal } from './proposal-lines';

/** A rule with the position of its sheet in the line. */
type Placed = { readonly rule: Rule; readonly layer: number };

/** C2: attacks go down in rank and hit no firm rule above; targets exist and are in force together with their attacker. */
export function checkAttacks(proposal: Proposal, days: readonly CalendarDate[]): readonly Finding[] {
  const { proposed } = proposal;
  const line = sheetsOfLine(worldAfter(proposal), proposed.code, days);
  const placed = new Map(line.flatMap(({ rules }, layer) => rules.map((rule): readonly [string, Placed] => [rule.id, { rule, layer }])));
  const excepted = new Set(proposed.memberships.flatMap(({ except }) => except.map(({ rule }) => rule)));
  const own = proposed.rules.flatMap((rule) => [...faultsOfTargets(rule, placed, excepted), ...faultsOfAlongside(rule, placed)]);
  return [...own, ...withdrawnTargets(proposal, days)];
}

function faultsOfTargets(rule: Rule, placed: ReadonlyMap<string, Placed>, excepted: ReadonlySet<string>): readonly Finding[] {
  const from = placed.get(rule.id);
  if (from === undefined) return [];
  return rule.targets.flatMap((target): readonly Finding[] => {
    const kind = faultOfAttack(from, placed.get(target));
    const said = { at: inRule(rule.id, 'targets'), values: { target } };
    if (kind !== null) return [fault('C2', { ...said, kind })];
    return excepted.has(target) ? [remark('C2', { ...said, kind: 'target-excepted' })] : [];
  });
}

function faultOfAttack(from: Placed, target: Placed | undefined): FindingKind | null {
  if (target === undefined) return 'target-unknown';
  if (!outranks(from, target)) return 'attack-upwards';
  if (target.rule.firm && from.layer > target.layer) return 'attack-on-firm';
  return inForceTogether(from.rule, target.rule) ? null : 'target-never-together';
}

/** By layer, then order, then id. */
function outranks(one: Placed, other: Placed): boolean {
  if (one.layer !== other.layer) return one.layer > other.layer;
  if (one.rule.order !== other.rule.order) return one.rule.order > other.rule.order;
  return one.rule.id > other.rule.id;
}

type Span = Pick<Rule, 'from' | 'to'>;

const beginsBeforeEndOf = (one: Span, other: Span): boolean => one.from === null || other.to === null || one.from < other.to;

export const inForceTogether = (one: Span, other: Span): boolean => beginsBeforeEndOf(one, other) && beginsBeforeEndOf(other, one);

function faultsOfAlongside({ id, alongside }: Rule, placed: ReadonlyMap<string, Placed>): readonly Finding[] {
  return alongside
    .filter((other) => !placed.has(other))
    .map((other) => fault('C2', { at: inRule(id, 'alongside'), kind: 'alongside-unknown', values: { other } }));
}

/** Rules taken out that sheets below still attack or leave out: no fault, for the attack then does nothing, but worth knowing. */
function withdrawnTargets(proposal: Proposal, days: readonly CalendarDate[]): readonly Finding[] {
  const { proposed, base, sheets } = proposal;
  const kept = new Set(proposed.rules.map(({ id }) => id));
  const gone = (base?.rules ?? []).filter(({ id }) => !kept.has(id)).map(({ id }) => id);
  if (gone.length === 0) return [];
  const below = regionsBelow(proposal, days).flatMap((code) => sheets.get(code) ?? []);
  return below.flatMap((sheet) =>
    gone
      .filter((id) => namesRule(sheet, id))
      .map((id) => remark('C2', { at: inRule(id, 'id'), kind: 'target-withdrawn', values: { rule: id, region: sheet.code } })),
  );
}

const namesRule = ({ rules, memberships }: Sheet, id: string): boolean =>
  rules.some(({ targets }) => targets.includes(id)) || memberships.some(({ except }) => except.some(({ rule }) => rule === id));
