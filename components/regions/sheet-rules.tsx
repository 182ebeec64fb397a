import type { ReactElement } from 'react';
import { Disclosure } from '@/components/ui/disclosure';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { words } from '@/lib/kernel/words';
import type { SheetNames } from '@/lib/regions/domain/sheet-names';
import { groupRules, type RuleGroup } from '@/lib/regions/domain/sheet-reading';
import type { SheetLayer } from '@/lib/regions/domain/told-sheet';
import type { ToldRule, ToldSource } from '@/lib/regions/domain/told-rule';
import { RuleCard, RuleLine } from './rule-card';

type Numbered = { readonly numberOf: (source: ToldSource) => number };

type RulesProps = Numbered & {
  readonly rules: readonly ToldRule[];
  readonly names: SheetNames;
  readonly today: CalendarDate;
  readonly authority: string | null;
};

/** A sheet's own rules, a part for each topic. */
export function RulesByTopic({ rules, ...card }: RulesProps): ReactElement {
  return (
    <>
      {groupRules(rules).map((group) => (
        <div key={group.topic} className="mt-6">
          <h3>{words(`regions.topic.${group.topic}`)}</h3>
          {group.rules.map((rule) => (
            <RuleCard key={rule.id} rule={rule} level={4} {...card} />
          ))}
        </div>
      ))}
    </>
  );
}

type LayerProps = Numbered & { readonly layer: SheetLayer; readonly leftOut: ReadonlySet<string> };

/** A layer above: its rules in short, folded on the screen and open on paper. */
export function LayerAbove({ layer, leftOut, numberOf }: LayerProps): ReactElement {
  const groups = groupRules(layer.rules.filter(({ id }) => !leftOut.has(id)));
  return (
    <Disclosure summary={words('regions.rules.layer', { name: layer.name, count: countIn(groups) })}>
      <p>
        <a href={`/regions/${layer.code}`}>{words('regions.rules.ownSheet', { name: layer.name })}</a>
      </p>
      {groups.map((group) => (
        <div key={group.topic} className="mt-4">
          <h3>{words(`regions.topic.${group.topic}`)}</h3>
          <ul>
            {group.rules.map((rule) => (
              <RuleLine key={rule.id} rule={rule} numberOf={numberOf} />
            ))}
          </ul>
        </div>
      ))}
    </Disclosure>
  );
}

/** Advice that is the same in every place: titles alone, each a link. Its own sheet has the rest. */
export function AdviceAbove({ layer, leftOut }: Omit<LayerProps, 'numberOf'>): ReactElement {
  const groups = groupRules(layer.rules.filter(({ id }) => !leftOut.has(id)));
  return (
    <Disclosure summary={words('regions.rules.layer', { name: layer.name, count: countIn(groups) })}>
      <p>
        <a href={`/regions/${layer.code}`}>{words('regions.rules.ownSheet', { name: layer.name })}</a>
      </p>
      {groups.map((group) => (
        <div key={group.topic} className="mt-4">
          <h3>{words(`regions.topic.${group.topic}`)}</h3>
          <ul className="ms-6 list-disc font-sans text-plain">
            {group.rules.map(({ id, title }) => (
              <li key={id}>
                <a className="inline-block py-1" href={`/rules/${id}`}>
                  {title}
                </a>
              </li>
            ))}
          </ul>
        </div>
      ))}
    </Disclosure>
  );
}

const countIn = (groups: readonly RuleGroup[]): number => groups.reduce((sum, group) => sum + group.rules.length, 0);
