import type { ReactElement } from 'react';
import { FootRingMark } from '@/components/site/foot-ring-mark';
import { sayPhrases } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { placeWords } from '@/lib/regions/domain/condition-words';
import { groupRegions, type ListedRegion } from '@/lib/regions/domain/listed-region';
import { ringsOf } from '@/lib/regions/domain/sheet-reading';

type Props = {
  readonly regions: readonly ListedRegion[];
  /** Names of every place, for the region lines. */
  readonly names: ReadonlyMap<string, string>;
};

/** Places by kind, each with its line, edition and what is known of its limits. */
export function RegionList({ regions, names }: Props): ReactElement {
  return (
    <>
      {groupRegions(regions).map(({ kind, regions: group }) => (
        <section key={kind} className="mt-8" aria-labelledby={`kind-${kind}`}>
          <h2 id={`kind-${kind}`}>{words(`regions.kinds.${kind}`)}</h2>
          {kind === 'bloc' || kind === 'standard' ? (
            <p className="mt-2 max-w-text text-umber">{words(`regions.kindsNote.${kind}`)}</p>
          ) : null}
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
          {line.length > 1 ? <li>{words('regions.list.line', { line: sayPhrases(layers) })}</li> : null}
          <li>{words('regions.list.edition', { number: edition })}</li>
          <li>{words(`regions.list.limits.${limits}`)}</li>
        </ul>
      </div>
    </li>
  );
}
