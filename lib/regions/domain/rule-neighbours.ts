import type { Rule } from './rule';
import type { Sheet } from './sheet';

/** A rule as another one's page names it. */
export type NamedRule = {
  readonly id: string;
  readonly title: string;
  readonly kind: Rule['kind'];
  readonly region: string;
  readonly regionName: string;
};

/** How a rule meets others: what it takes the place of, what takes its own, what it stands beside, where it does not reach. */
export type RuleNeighbours = {
  readonly targets: readonly NamedRule[];
  readonly attackers: readonly NamedRule[];
  readonly alongside: readonly NamedRule[];
  readonly leftOutIn: readonly { readonly region: string; readonly regionName: string; readonly why: string }[];
};

type Asked = Pick<Rule, 'id' | 'targets' | 'alongside'>;

/** The neighbours of a rule among all sheets in use. */
export function neighboursOf(rule: Asked, sheets: readonly Sheet[]): RuleNeighbours {
  const all = sheets.flatMap((sheet) =>
    sheet.rules.map((one) => ({
      named: { id: one.id, title: one.title, kind: one.kind, region: sheet.code, regionName: sheet.name },
      one,
    })),
  );
  const pick = (wanted: (one: Rule) => boolean): readonly NamedRule[] => all.filter(({ one }) => wanted(one)).map(({ named }) => named);
  return {
    targets: pick(({ id }) => rule.targets.includes(id)),
    attackers: pick(({ targets }) => targets.includes(rule.id)),
    alongside: pick(({ id, alongside }) => rule.alongside.includes(id) || alongside.includes(rule.id)),
    leftOutIn: sheets.flatMap(({ code, name, memberships }) =>
      memberships.flatMap(({ except }) =>
        except.filter((left) => left.rule === rule.id).map(({ why }) => ({ region: code, regionName: name, why })),
      ),
    ),
  };
}
