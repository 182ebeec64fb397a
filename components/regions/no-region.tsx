import type { ReactElement } from 'react';
import { LinkButton } from '@/components/ui/link-button';
import { words } from '@/lib/kernel/words';
import type { ListedRegion } from '@/lib/regions/domain/listed-region';
import { foldText } from '@/lib/regions/domain/region-search';

type Props = { readonly asked: string; readonly nearest: readonly ListedRegion[] };

/** No sheet for what was sought: what was looked for, what that does not mean, the nearest names, and how to ask for one. */
export function NoRegion({ asked, nearest }: Props): ReactElement {
  const read = foldText(asked);
  return (
    <section className="mt-8 flex max-w-text flex-col gap-4" aria-labelledby="no-region">
      <h2 id="no-region">{words('regions.list.none.title')}</h2>
      {read === asked.toLowerCase() ? null : <p>{words('regions.list.none.asked', { asked, read })}</p>}
      <p>{words('regions.list.none.meaning')}</p>
      {nearest.length === 0 ? null : (
        <div>
          <p>{words('regions.list.none.nearest')}</p>
          <ul className="ms-6 list-disc">
            {nearest.map(({ code, name }) => (
              <li key={code}>
                <a href={`/regions/${code}`}>{name}</a>
              </li>
            ))}
          </ul>
        </div>
      )}
      <p>
        <LinkButton kind="plain" href="/regions/wishes">
          {words('library.wish.title')}
        </LinkButton>
      </p>
      <p>
        <a href="/regions/new">{words('amend.newPlace.link')}</a>
      </p>
      <p>
        <a href="/contact">{words('regions.list.none.ask')}</a>
      </p>
      <p>
        <a href="/regions">{words('regions.list.showAll')}</a>
      </p>
    </section>
  );
}
