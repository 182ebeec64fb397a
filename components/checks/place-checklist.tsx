import type { ReactElement } from 'react';
import { DefinitionList } from '@/components/ui/definition-list';
import type { RegionChecklist } from '@/lib/checks/domain/checklist';
import { sectionsOf } from '@/lib/checks/domain/sections';
import type { TimelineStep } from '@/lib/checks/domain/timeline';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { namesTerm } from '@/lib/regions/domain/term-uses';
import { ChecklistSections } from './checklist-sections';
import { ChangeList } from './changes-panel';
import type { ListView } from './list-view';
import { WhomToAsk } from './whom-to-ask';

type Props = { readonly region: RegionChecklist; readonly view: ListView; readonly timeline: readonly TimelineStep[] };

/** The whole checklist for one place. */
export function PlaceChecklist({ region, view, timeline }: Props): ReactElement {
  return (
    <>
      <Counts region={region} />
      <ChecklistSections region={region} view={view} />
      <Coming region={region} timeline={timeline} />
      <Classes region={region} view={view} />
      <NotInherited region={region} view={view} />
      <WhomToAsk {...region} placeNames={view.placeNames} />
    </>
  );
}

/** How many lines stand in each part, each count a way to it. */
function Counts({ region }: Pick<Props, 'region'>): ReactElement {
  const sections = sectionsOf(region.rules);
  const parts = (['sources-disagree', 'applies', 'treat-as-applying', 'not-settled', 'does-not-apply', 'said'] as const).filter(
    (name) => sections[name].length > 0,
  );
  return (
    <nav className="not-in-print mt-8" aria-label={words('checks.result.jump')}>
      <ul className="flex flex-wrap gap-x-6 gap-y-2 font-sans text-plain">
        {parts.map((name) => (
          <li key={name}>
            <a href={`#${region.code}-${name}`}>{words(`checks.result.sections.${name}`)}</a> ({sections[name].length})
          </li>
        ))}
        <li>
          <a href={`#${region.code}-ask`}>{words('checks.result.sections.ask')}</a>
        </li>
      </ul>
    </nav>
  );
}

function Coming({ region: { coming, code }, timeline }: Pick<Props, 'region' | 'timeline'>): ReactElement | null {
  if (coming.length === 0 && timeline.length === 0) return null;
  const id = `${code}-coming`;
  return (
    <section className="mt-8" aria-labelledby={id}>
      <h2 id={id}>{words('checks.result.sections.coming')}</h2>
      <ul>
        {coming.map(({ id: rule, title, from }) => (
          <li key={rule} className="py-1">
            {words('checks.result.sectionTexts.coming', { date: sayDate(from) })} <a href={`/rules/${rule}`}>{title}</a>
          </li>
        ))}
      </ul>
      {timeline.length === 0 ? null : <Timeline steps={timeline} />}
    </section>
  );
}

/** What each coming day changes for this very piece. */
function Timeline({ steps }: { readonly steps: readonly TimelineStep[] }): ReactElement {
  return (
    <>
      <h3 className="mt-4">{words('checks.coming.title')}</h3>
      <p>{words('checks.coming.text')}</p>
      <ol>
        {steps.map(({ on, changes }) => (
          <li key={on} className="py-1">
            <p>{words('checks.coming.from', { date: sayDate(on) })}</p>
            {changes === null ? <p>{words('checks.coming.unreadable')}</p> : <ChangeList changes={changes} />}
          </li>
        ))}
      </ol>
    </>
  );
}

/** Whether some limit of this list speaks of that kind of ware: one whose limits were not taken over decides nothing here. */
const limitsTurnOn = (term: string, rules: RegionChecklist['rules'], { told }: ListView): boolean =>
  rules.some(({ id }) => {
    const rule = told.get(id);
    return rule?.topic === 'limit' && namesTerm(rule.when, term);
  });

function Classes({ region: { categories, rules, code }, view }: Omit<Props, 'timeline'>): ReactElement | null {
  const possible = categories.filter(({ term, possible: canBe }) => canBe && limitsTurnOn(term, rules, view));
  if (possible.length === 0) return null;
  const id = `${code}-categories`;
  return (
    <section className="mt-8" aria-labelledby={id}>
      <h2 id={id}>{words('checks.result.sections.categories')}</h2>
      <p>{words('checks.result.sectionTexts.categories')}</p>
      <DefinitionList
        entries={possible.map(({ term, name, region }) => ({
          id: term,
          name: <a href={`/regions/${region}#term-${term}`}>{name}</a>,
          value: `${view.placeNames.get(region) ?? region}, ${words('checks.result.possible')}`,
        }))}
      />
    </section>
  );
}

/** Rules of a layer above that do not reach the place, those left out for one reason together. */
function NotInherited({ region: { notInherited, code }, view }: Omit<Props, 'timeline'>): ReactElement | null {
  if (notInherited.length === 0) return null;
  const id = `${code}-not-inherited`;
  const reasons = [...new Set(notInherited.map(({ why }) => why))];
  return (
    <section className="mt-8" aria-labelledby={id}>
      <h2 id={id}>{words('checks.result.notInherited')}</h2>
      <ul className="list-disc ps-6">
        {reasons.map((reason) => (
          <li key={reason} className="py-1">
            {reason}
            <ul className="ps-6">
              {notInherited
                .filter(({ why }) => why === reason)
                .map(({ rule }) => (
                  <li key={rule}>
                    <a href={`/rules/${rule}`}>{view.told.get(rule)?.title ?? rule}</a>
                  </li>
                ))}
            </ul>
          </li>
        ))}
      </ul>
    </section>
  );
}
