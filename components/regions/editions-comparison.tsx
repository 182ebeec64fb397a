import type { ReactElement, ReactNode } from 'react';
import { DefinitionList } from '@/components/ui/definition-list';
import { Disclosure } from '@/components/ui/disclosure';
import type { RuleMeaning } from '@/lib/checks/domain/meaning';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate, sayList } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import {
  changedMeanings,
  changedUnedited,
  type ComparedEdition,
  type ComparedEditions,
  type ComparedNames,
  type PlaceBelow,
} from '@/lib/regions/domain/compared-editions';
import { DIFFERENCE_LISTS, type ItemDifference } from '@/lib/regions/domain/sheet-difference';
import { RuleLink } from './field-words';
import { ItemDifferenceBlock } from './item-difference';
import { RuleMeaningWords, type Sides } from './rule-meaning';
import { TrialChanges } from './trial-changes';

/** Two editions of a sheet side by side: in short, then every change, then what it does elsewhere. */
export function EditionsComparison({ compared }: { readonly compared: ComparedEditions }): ReactElement {
  const { items, meanings, below, trials, names } = compared;
  return (
    <>
      <Summary compared={compared} />
      <SheetDifferences items={items} meanings={meanings.ok ? meanings.value : []} names={names} sides="editions" />
      <UneditedRules meanings={changedUnedited(meanings, items)} names={names} sides="editions" />
      <PlacesBelow below={below} names={names} sides="editions" />
      <TrialChanges trials={trials} names={names} sides="editions" />
    </>
  );
}

function Summary({ compared }: { readonly compared: ComparedEditions }): ReactElement {
  const { code, from, to, items, meanings, below } = compared;
  const touched = below.filter((place) => changedMeanings(place.meanings).length > 0).length;
  const edition = ({ number, inUseFrom, summary }: ComparedEdition, id: 'from' | 'to') => ({
    id,
    name: words(`editions.${id}`),
    value: (
      <>
        <a href={`/regions/${code}/editions/${String(number)}`}>{words('editions.summary.edition', { number })}</a>,{' '}
        {words('editions.summary.inUse', { date: sayDate(calendarDateOf(inUseFrom)), summary })}
      </>
    ),
  });
  return (
    <section className="mt-6 max-w-text" aria-label={words('editions.summary.label')}>
      <DefinitionList entries={[edition(from, 'from'), edition(to, 'to')]} />
      <ul className="mt-4 list-disc ps-6 font-sans text-plain">
        <li>{words('editions.summary.items', { count: items.length })}</li>
        <li>
          {meanings.ok ? words('editions.summary.meaning', { count: changedMeanings(meanings).length }) : words('editions.means.fault')}
        </li>
        <li>{below.length === 0 ? words('editions.summary.noBelow') : words('editions.summary.below', { count: touched })}</li>
      </ul>
    </section>
  );
}

type DifferencesProps = {
  readonly items: readonly ItemDifference[];
  readonly meanings: readonly RuleMeaning[];
  readonly names: ComparedNames;
  readonly sides: Sides;
  /** What a page puts below one change: remarks on it. */
  readonly below?: (item: ItemDifference) => ReactNode;
};

/** Every change of a sheet under the heading of its list. */
export function SheetDifferences({ items, meanings, names, sides, below }: DifferencesProps): ReactElement {
  const meaningOf = new Map(meanings.map((meaning) => [meaning.rule, meaning]));
  return (
    <>
      {DIFFERENCE_LISTS.map((list) => {
        const own = items.filter((item) => item.list === list);
        return own.length === 0 ? null : (
          <section key={list} className="mt-8" aria-labelledby={`changed-${list}`}>
            <h2 id={`changed-${list}`}>{words(`editions.list.${list}`)}</h2>
            {own.map((item) => (
              <ItemDifferenceBlock
                key={item.id}
                item={item}
                meaning={list === 'rules' ? meaningOf.get(item.id) : undefined}
                names={names}
                sides={sides}
              >
                {below?.(item)}
              </ItemDifferenceBlock>
            ))}
          </section>
        );
      })}
    </>
  );
}

type MeaningsProps = { readonly meanings: readonly RuleMeaning[]; readonly names: ComparedNames; readonly sides: Sides };

/** Rules that a changed word, or another rule, makes mean something else. */
export function UneditedRules({ meanings, names, sides }: MeaningsProps): ReactElement | null {
  if (meanings.length === 0) return null;
  return (
    <section className="mt-8" aria-labelledby="changed-unedited">
      <h2 id="changed-unedited">{words('editions.others.title')}</h2>
      <p className="mt-2 max-w-text">{words('editions.others.lead')}</p>
      <MeaningList meanings={meanings} names={names} sides={sides} />
    </section>
  );
}

function MeaningList({ meanings, names, sides }: MeaningsProps): ReactElement {
  return (
    <ul className="mt-3 flex flex-col gap-4 font-sans text-plain">
      {meanings.map((meaning) => (
        <li key={meaning.rule} className="keep-together">
          <RuleLink id={meaning.rule} names={names} />
          <RuleMeaningWords meaning={meaning} placeNames={names.regions} sides={sides} />
        </li>
      ))}
    </ul>
  );
}

type BelowProps = { readonly below: readonly PlaceBelow[]; readonly names: ComparedNames; readonly sides: Sides };

/** What the places that read this sheet as a layer above take over from the change. */
export function PlacesBelow({ below, names, sides }: BelowProps): ReactElement | null {
  if (below.length === 0) return null;
  const touched = below.filter(({ meanings }) => !meanings.ok || changedMeanings(meanings).length > 0);
  const same = below.filter((place) => !touched.includes(place));
  return (
    <section className="mt-8" aria-labelledby="changed-below">
      <h2 id="changed-below">{words('editions.below.title')}</h2>
      <p className="mt-2 max-w-text">{words(touched.length === 0 ? 'editions.below.none' : 'editions.below.lead')}</p>
      {touched.map(({ code, name, meanings }) => (
        <Disclosure
          key={code}
          summary={words('editions.below.place', { name, count: changedMeanings(meanings).length })}
          open={touched.length === 1}
        >
          {meanings.ok ? (
            <MeaningList meanings={changedMeanings(meanings)} names={names} sides={sides} />
          ) : (
            <p>{words('editions.means.fault')}</p>
          )}
        </Disclosure>
      ))}
      {same.length === 0 || touched.length === 0 ? null : (
        <p className="mt-3 font-sans text-plain">{words('editions.below.unchanged', { places: sayList(same.map(({ name }) => name)) })}</p>
      )}
    </section>
  );
}
