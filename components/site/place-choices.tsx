import type { ReactElement, ReactNode } from 'react';
import { Choice } from '@/components/ui/choice';
import { FieldGroup } from '@/components/ui/field';
import { sayList } from '@/lib/kernel/say';
import { LOCALE, words } from '@/lib/kernel/words';
import { groupByPart, type PartGroup } from '@/lib/regions/domain/world-parts';

export type PlaceChoice = { readonly code: string; readonly name: string; readonly line: readonly string[]; readonly kind?: string };

type Props = {
  readonly id: string;
  readonly name: string;
  readonly legend: ReactNode;
  readonly hint: ReactNode;
  readonly error?: string | undefined;
  readonly places: readonly PlaceChoice[];
  readonly chosen: readonly string[];
};

const BY_NAME = new Intl.Collator(LOCALE, { sensitivity: 'base' });

/**
 * Any number of places, folded by part of the world; a part with a chosen place stands open and names it. The first part's heading
 * carries the id, so that a summary of faults leads there.
 */
export function PlaceChoices({ id, name, places, chosen, ...group }: Props): ReactElement {
  const names = new Map(places.map((place) => [place.code, place.name]));
  return (
    <FieldGroup id={id} {...group}>
      {groupByPart(places, BY_NAME).map((part, place) => (
        <Part key={part.part} id={id} isFirst={place === 0} name={name} part={part} names={names} chosen={chosen} />
      ))}
    </FieldGroup>
  );
}

type PartProps = Pick<Props, 'id' | 'name' | 'chosen'> & {
  readonly isFirst: boolean;
  readonly part: PartGroup<PlaceChoice>;
  readonly names: ReadonlyMap<string, string>;
};

function Part({ id, isFirst, name, part: { part, regions }, names, chosen }: PartProps): ReactElement {
  const taken = regions.filter(({ code }) => chosen.includes(code));
  return (
    <details className="disclosure place-part" open={taken.length > 0}>
      <summary {...(isFirst ? { id } : {})}>
        {words('library.places.part', { part: words(`library.parts.${part}`), count: regions.length })}
        {taken.length === 0 ? null : (
          <span className="place-taken">{words('library.places.chosen', { places: sayList(taken.map((one) => one.name)) })}</span>
        )}
      </summary>
      <div className="place-list">
        {regions.map(({ code, name: label, line }) => {
          const above = line.slice(0, -1).map((layer) => names.get(layer) ?? layer);
          const option = { value: code, label, hint: above.join(', ') || undefined };
          return <Choice key={code} id={`${id}-${code}`} type="checkbox" name={name} option={option} chosen={chosen.includes(code)} />;
        })}
      </div>
    </details>
  );
}
