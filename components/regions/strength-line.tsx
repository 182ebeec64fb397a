import type { ReactElement } from 'react';
import { Badge } from '@/components/ui/badge';
import { words } from '@/lib/kernel/words';
import type { Evidence, Standing, Strength } from '@/lib/regions/domain/rule';

type Props = { readonly strength: Strength; readonly standing: Standing; readonly evidence?: Evidence };

/** How strongly it is asked, and whose word that is: "Must, by law". A figure or text from memory carries its mark. */
export function StrengthLine({ strength, standing, evidence = 'read' }: Props): ReactElement {
  return (
    <p className="flex flex-wrap items-center gap-2 font-sans text-plain">
      <span>
        {words.rich('regions.rule.strength', {
          strength: words(`regions.strength.${strength}`),
          standing: words(`regions.standing.${standing}`),
          b: (said) => <strong className="font-strong">{said}</strong>,
        })}
      </span>
      {evidence === 'memory' && standing !== 'common-practice' ? <MemoryMark /> : null}
    </p>
  );
}

/** Says that something was not read in its source. */
export function MemoryMark(): ReactElement {
  return <Badge colour="ash">{words('regions.rule.memory')}</Badge>;
}
