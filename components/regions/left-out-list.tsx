import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';
import type { RegionSheet } from '@/lib/regions/domain/told-sheet';

/** Rules of a layer above that do not reach this place, each with the reason. */
export function LeftOutList({ sheet }: { readonly sheet: RegionSheet }): ReactElement {
  const titles = new Map(sheet.above.flatMap(({ rules }) => rules.map(({ id, title }) => [id, title])));
  return (
    <>
      <p>{words('regions.rules.leftOut', { name: sheet.name })}</p>
      <ul className="mt-2 max-w-text">
        {sheet.notInherited.map(({ rule, why }) => (
          <li key={rule} className="keep-together border-b border-rule py-3">
            <a className="font-strong" href={`/rules/${rule}`}>
              {titles.get(rule) ?? rule}
            </a>
            <p>{why}</p>
          </li>
        ))}
      </ul>
    </>
  );
}
