import type { ReactElement, ReactNode } from 'react';

type Entry = { readonly id: string; readonly name: ReactNode; readonly value: ReactNode; readonly act?: ReactNode };

/** Names and what they stand for; `act` is a link beside a value ("Mend"). */
export function DefinitionList({ entries }: { readonly entries: readonly Entry[] }): ReactElement {
  return (
    <dl className="definitions">
      {entries.map(({ id, name, value, act }) => (
        <div key={id}>
          <dt>{name}</dt>
          <dd className="flex flex-wrap justify-between gap-4">
            <span>{value}</span>
            {act === undefined ? null : <span>{act}</span>}
          </dd>
        </div>
      ))}
    </dl>
  );
}
