import type { ReactElement } from 'react';
import { Badge } from '@/components/ui/badge';
import { Disclosure } from '@/components/ui/disclosure';
import { words } from '@/lib/kernel/words';
import type { SheetNames } from '@/lib/regions/domain/sheet-names';
import type { ToldTerm } from '@/lib/regions/domain/told-sheet';
import type { ToldSource } from '@/lib/regions/domain/told-rule';
import { ConditionSentence } from './condition-sentence';
import { SourceDetails } from './source-details';

type Props = {
  readonly terms: readonly ToldTerm[];
  readonly names: SheetNames;
  readonly numberOf: (source: ToldSource) => number;
};

/** Words that rules use, each under an address of its own. */
export function TermList({ terms, names, numberOf }: Props): ReactElement {
  return (
    <>
      {terms.map((term) => (
        <article
          key={term.id}
          id={`term-${term.id}`}
          className="keep-together border-b border-rule py-4"
          aria-labelledby={`term-${term.id}-name`}
        >
          <h3 id={`term-${term.id}-name`} className="flex flex-wrap items-center gap-2">
            {term.name} {term.category ? <Badge>{words('regions.terms.category')}</Badge> : null}
          </h3>
          <p className="mt-2">{term.says}</p>
          <Disclosure summary={words('regions.terms.holds')}>
            <ConditionSentence condition={term.when} names={names} of="term" />
            {term.sources.length === 0 ? null : (
              <div className="mt-3">
                <SourceDetails sources={term.sources} numberOf={numberOf} />
              </div>
            )}
            <p className="not-in-print mt-3 font-sans text-plain">
              <a href={`/terms/${term.id}`}>{words('regions.terms.uses')}</a>
            </p>
          </Disclosure>
        </article>
      ))}
    </>
  );
}
