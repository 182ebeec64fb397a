import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';

/** How well a cited figure is known; the mark says so where it is not plainly read. */
export type CiteState = 'read' | 'memory' | 'common-practice' | 'weak';

type Props = { readonly number: number; readonly state: CiteState };

/** The number of a source, leading to its line in the list. */
export function CiteMark({ number, state }: Props): ReactElement {
  const said = wordsOf(number, state);
  return (
    <sup className="cite">
      <a href={`#source-${number}`} aria-label={said.name}>
        {said.mark}
      </a>
    </sup>
  );
}

function wordsOf(number: number, state: CiteState): { readonly mark: string; readonly name: string } {
  switch (state) {
    case 'read':
      return { mark: String(number), name: words('notes.cite.source', { number }) };
    case 'memory':
      return { mark: words('notes.cite.markMemory', { number }), name: words('notes.cite.memory', { number }) };
    case 'common-practice':
      return { mark: words('notes.cite.markPractice', { number }), name: words('notes.cite.practice', { number }) };
    case 'weak':
      return { mark: words('notes.cite.markWeak', { number }), name: words('notes.cite.weak', { number }) };
  }
}
