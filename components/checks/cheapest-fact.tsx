import type { ReactElement } from 'react';
import { Panel } from '@/components/ui/panel';
import type { Fact } from '@/lib/checks/domain/cheapest-fact';
import type { RegionChecklist } from '@/lib/checks/domain/checklist';
import { words } from '@/lib/kernel/words';
import { questionWords } from './question-words';

type Props = {
  readonly facts: readonly Fact[];
  readonly regions: readonly RegionChecklist[];
  /** Address of the check, to answer from here. */
  readonly base: string;
};

/** Which one answer settles most of what is open, what it takes to find it out, and the two after it. */
export function CheapestFact({ facts, regions, base }: Props): ReactElement | null {
  const [best, ...rest] = facts.filter(({ atBest }) => atBest > 0);
  if (best === undefined) return null;
  const titles = new Map(regions.flatMap(({ rules }) => rules.map(({ id, title }) => [id, title])));
  return (
    <div className="mt-6">
      <Panel colour="cobalt" label={words('checks.fact.title')}>
        <h2>{words('checks.fact.title')}</h2>
        <FactLine fact={best} base={base} />
        {best.settles.length === 0 ? null : (
          <details className="disclosure">
            <summary>{words('checks.fact.would')}</summary>
            <ul className="list-disc ps-6">
              {best.settles.map((id) => (
                <li key={id}>
                  <a href={`/rules/${id}`}>{titles.get(id) ?? id}</a>
                </li>
              ))}
            </ul>
          </details>
        )}
        {rest.length === 0 ? null : (
          <>
            <p className="mt-2">{words('checks.fact.next')}</p>
            <ol className="list-decimal ps-6">
              {rest.slice(0, 2).map((fact) => (
                <li key={fact.question}>
                  <FactLine fact={fact} base={base} />
                </li>
              ))}
            </ol>
          </>
        )}
      </Panel>
    </div>
  );
}

function FactLine({ fact: { question, means, settles, atBest }, base }: { readonly fact: Fact; readonly base: string }): ReactElement {
  const said = [
    words(`checks.fact.means.${means}`),
    words('checks.fact.settles', { count: settles.length }),
    ...(atBest > settles.length ? [words('checks.fact.best', { count: atBest })] : []),
  ];
  return (
    <p>
      <a href={`${base}/${question}`}>{questionWords(question, 'short')}</a>. {said[0]}. {said.slice(1).join('; ')}.
    </p>
  );
}
