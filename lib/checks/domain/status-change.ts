import type { JudgedRule, RegionChecklist } from './checklist';
import type { Status } from './judge';

/** A rule whose status differs between two checklists of the same piece. Null: the rule is not in that checklist. */
export type StatusChange = {
  readonly region: string;
  readonly rule: string;
  readonly title: string;
  readonly before: Status | null;
  readonly after: Status | null;
};

/** What changed from one list of checklists to another, place by place, in the order of the later one. */
export function changesBetween(before: readonly RegionChecklist[], after: readonly RegionChecklist[]): readonly StatusChange[] {
  return after.flatMap(({ code, rules }) => {
    const earlier = new Map((before.find((region) => region.code === code)?.rules ?? []).map((rule) => [rule.id, rule]));
    const later = new Set(rules.map(({ id }) => id));
    const changed = rules
      .filter((rule) => earlier.get(rule.id)?.status !== rule.status)
      .map((rule) => changeOf(code, rule, earlier.get(rule.id)?.status ?? null, rule.status));
    const gone = [...earlier.values()].filter(({ id }) => !later.has(id)).map((rule) => changeOf(code, rule, rule.status, null));
    return [...changed, ...gone];
  });
}

const changeOf = (region: string, { id, title }: JudgedRule, before: Status | null, after: Status | null): StatusChange => ({
  region,
  rule: id,
  title,
  before,
  after,
});
