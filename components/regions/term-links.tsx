import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';
import type { LimitRow } from '@/lib/regions/domain/limit-rows';

/** The kinds of ware a limit speaks of, one under another and each large enough to press; "all" where it names none. */
export function TermLinks({ categories }: Pick<LimitRow, 'categories'>): ReactElement {
  if (categories.length === 0) return <>{words('regions.limits.all')}</>;
  return (
    <>
      {categories.map(({ id, name, region }) => (
        <a key={id} className="block py-1" href={`/regions/${region}#term-${id}`}>
          {name}
        </a>
      ))}
    </>
  );
}
