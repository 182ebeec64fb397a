import type { ReactElement } from 'react';
import { DataTable } from '@/components/ui/data-table';
import { sayList } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { sayDecision, sayLimit, sayPart } from '@/lib/regions/domain/figure-words';
import type { LimitRow } from '@/lib/regions/domain/limit-rows';
import type { SubstanceLimits } from '@/lib/regions/domain/substance-limits';
import { SourceTitle } from './source-details';
import { MemoryMark, StrengthLine } from './strength-line';
import { TermLinks } from './term-links';

type Props = { readonly limits: SubstanceLimits; readonly name: string };

const COLUMNS = [
  { id: 'place', heading: words('readings-page.substance.place') },
  { id: 'category', heading: words('regions.limits.category') },
  { id: 'figure', heading: words('regions.limits.figure') },
  { id: 'decision', heading: words('regions.limits.decision') },
  { id: 'word', heading: words('regions.limits.word') },
  { id: 'source', heading: words('readings-page.substance.source') },
] as const;

/** Every limit on one substance, place by place, and the places where we found none. */
export function SubstanceLimitsTable({ limits: { places, above, notFound }, name }: Props): ReactElement {
  const rows = places.flatMap((place) => place.rows.map((row) => ({ place, row })));
  return (
    <>
      {rows.length === 0 ? (
        <p className="mt-6">{words('readings-page.substance.none', { name })}</p>
      ) : (
        <div className="mt-6">
          <DataTable
            id="substance-limits"
            caption={words('readings-page.substance.caption', { name })}
            columns={COLUMNS}
            rows={rows.map(({ place, row }) => ({
              id: row.rule.id,
              cells: {
                place: <a href={`/regions/${place.code}`}>{place.name}</a>,
                category: <TermLinks categories={row.categories} />,
                figure: <Figure row={row} />,
                decision: sayDecision(row.limit.decision).join(' '),
                word: <StrengthLine strength={row.rule.strength} standing={row.rule.standing} evidence={row.limit.decision.evidence} />,
                source: <Source row={row} />,
              },
            }))}
          />
        </div>
      )}
      <Above above={above} />
      <NotFound notFound={notFound} />
    </>
  );
}

type RowProps = { readonly row: LimitRow };

/** The figure, and whether it was read in its source. */
function Figure({ row: { limit } }: RowProps): ReactElement {
  return (
    <>
      {sayLimit(limit)}
      <span className="block text-small text-umber">{sayPart(limit)}</span>
      {limit.amount.evidence === 'memory' ? (
        <MemoryMark />
      ) : (
        <span className="block text-small text-umber">{words('readings-page.substance.evidence.read')}</span>
      )}
    </>
  );
}

function Source({ row: { rule } }: RowProps): ReactElement {
  const [source] = rule.sources;
  return (
    <span className="wrap-anywhere">
      <a href={`/rules/${rule.id}`}>{rule.title}</a>
      {source === undefined ? null : (
        <span className="block">
          <SourceTitle title={source.title} url={source.url} />
          {source.locator === undefined ? null : <>, {source.locator}</>}
        </span>
      )}
    </span>
  );
}

function Above({ above }: Pick<SubstanceLimits, 'above'>): ReactElement | null {
  if (above.length === 0) return null;
  return (
    <section className="mt-8" aria-labelledby="above">
      <h2 id="above">{words('readings-page.substance.above')}</h2>
      <ul className="mt-2 ms-6 list-disc">
        {above.map(({ code, name, layers }) => (
          <li key={code}>
            {words.rich('readings-page.substance.aboveOf', {
              place: name,
              layers: sayList(layers),
              link: (said) => <a href={`/regions/${code}`}>{said}</a>,
            })}
          </li>
        ))}
      </ul>
    </section>
  );
}

function NotFound({ notFound }: Pick<SubstanceLimits, 'notFound'>): ReactElement | null {
  if (notFound.length === 0) return null;
  return (
    <section className="mt-8 max-w-text" aria-labelledby="not-found">
      <h2 id="not-found">{words('readings-page.substance.notHere')}</h2>
      <p className="mt-2">{words('readings-page.substance.notHereText')}</p>
      <ul className="mt-2 ms-6 list-disc">
        {notFound.map(({ code, name }) => (
          <li key={code}>
            <a href={`/regions/${code}`}>{name}</a>
          </li>
        ))}
      </ul>
    </section>
  );
}
