import type { ReactElement } from 'react';
import { FootRingMark } from '@/components/site/foot-ring-mark';
import { sayPhrases } from '@/lib/kernel/say';
import { LOCALE, words } from '@/lib/kernel/words';
import { placeWords } from '@/lib/regions/domain/condition-words';
import type { ListedRegion } from '@/lib/regions/domain/listed-region';
import { ringsOf } from '@/lib/regions/domain/sheet-reading';
import { groupByPart } from '@/lib/regions/domain/world-parts';

type Props = {
  readonly regions: readonly ListedRegion[];
  /** Names of every place, for the region lines. */
  readonly names: ReadonlyMap<string, string>;
};

const BY_NAME = new Intl.Collator(LOCALE, { sensitivity: 'base' });

/** Places by part of the world, each with its line, edition and what is known of its limits. */
export function RegionList({ regions, names }: Props): ReactElement {
  return (
    <>
      {groupByPart(regions, BY_NAME).map(({ part, regions: group }) => (
        <section key={part} className="mt-8" aria-labelledby={`part-${part}`}>
          <h2 id={`part-${part}`}>{words(`library.parts.${part}`)}</h2>
          {part === 'standards' ? <p className="mt-2 max-w-text text-umber">{words('regions.kindsNote.standard')}</p> : null}
          <ul className="mt-3 grid gap-x-8 lg:grid-cols-2">
            {group.map((region) => (
              <RegionItem key={region.code} region={region} names={names} />
            ))}
          </ul>
        </section>
      ))}
    </>
  );
}

type ItemProps = { readonly region: ListedRegion; readonly names: Props['names'] };

function RegionItem({ region: { code, name, kind, line, edition, limits }, names }: ItemProps): ReactElement {
  const layers = line.map((layer) => names.get(layer) ?? placeWords(layer));
  return (
    <li className="flex items-start gap-4 border-b border-rule py-3">
      <FootRingMark size={44} rings={ringsOf(kind)} />
      <div>
        <p className="font-strong">
          <a href={`/regions/${code}`}>{name}</a>
        </p>
        <ul className="flex flex-wrap gap-x-4 font-sans text-plain text-umber">
          {kind === 'bloc' ? <li>{words('regions.kinds.bloc')}</li> : null}
          {line.length > 1 ? <li>{words('regions.list.line', { line: sayPhrases(layers) })}</li> : null}
          <li>{words('regions.list.edition', { number: edition })}</li>
          <li>{words(`regions.list.limits.${limits}`)}</li>
        </ul>
      </div>
    </li>
  );
}
