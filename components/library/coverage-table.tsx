import type { ReactElement } from 'react';
import { DataTable } from '@/components/ui/data-table';
import { words } from '@/lib/kernel/words';
import type { CoveredCountry } from '@/lib/regions/domain/coverage';

/** Countries with a sheet as a table, those without as a list of names: nothing can be read of them. */
export function CoverageTable({ countries }: { readonly countries: readonly CoveredCountry[] }): ReactElement {
  const columns = [
    { id: 'country', heading: words('coverage.country') },
    { id: 'state', heading: words('coverage.state') },
  ];
  const rows = countries
    .filter(({ state }) => state !== 'no-sheet')
    .map(({ code, name, state }) => ({
      id: code,
      cells: { country: <a href={`/regions/${code}`}>{name}</a>, state: words(`coverage.states.${state}`) },
    }));
  const without = countries.filter(({ state }) => state === 'no-sheet');
  return (
    <>
      <div className="mt-8 max-w-text">
        <DataTable id="coverage" caption={words('coverage.table')} columns={columns} rows={rows} />
      </div>
      <section aria-labelledby="without" className="mt-8">
        <h2 id="without">{words('coverage.without')}</h2>
        <ul className="coverage-names mt-3">
          {without.map(({ code, name }) => (
            <li key={code}>{name}</li>
          ))}
        </ul>
        <p className="mt-4">
          <a href="/regions/wishes">{words('coverage.ask')}</a>
        </p>
      </section>
    </>
  );
}
