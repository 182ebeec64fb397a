import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';
import { sideOf, type Passage, type TextDifference, type WordPart } from '@/lib/regions/domain/text-difference';

type Changed = Extract<TextDifference, { readonly kind: 'changed' }>;

/** One version of a text, with what only it has marked. */
export function WordingSide({ difference, side }: { readonly difference: Changed; readonly side: 'before' | 'after' }): ReactElement {
  return (
    <div className="wording">
      {sideOf(difference.passages, side).map((passage, place) => (
        <p key={place}>
          <PassageWords passage={passage} />
        </p>
      ))}
    </div>
  );
}

/** Both versions in one text: what went and what came stand beside each other, passages that nobody touched are counted. */
export function WordingTogether({ difference }: { readonly difference: Changed }): ReactElement {
  return (
    <div className="wording">
      {folded(difference.passages).map((passage, place) => (
        <p key={place}>{typeof passage === 'number' ? <Untouched count={passage} /> : <PassageWords passage={passage} />}</p>
      ))}
    </div>
  );
}

const Untouched = ({ count }: { readonly count: number }): ReactElement => (
  <span className="text-umber">{words('editions.text.kept', { count })}</span>
);

/** Runs of passages that both versions have as their count; what moved is told where it is now. */
function folded(passages: readonly Passage[]): readonly (Passage | number)[] {
  const found: (Passage | number)[] = [];
  for (const passage of passages) {
    const last = found.at(-1);
    if (passage.kind === 'moved-away') continue;
    if (passage.kind !== 'kept') found.push(passage);
    else if (typeof last === 'number') found.splice(-1, 1, last + 1);
    else found.push(1);
  }
  return found;
}

function PassageWords({ passage }: { readonly passage: Passage }): ReactElement {
  switch (passage.kind) {
    case 'kept':
      return <>{passage.text}</>;
    case 'added':
    case 'removed':
      return <Mark part={{ kind: passage.kind, text: passage.text }} />;
    case 'moved':
    case 'moved-away':
      return (
        <>
          <span className="wording-label">{words('editions.text.moved')}</span> {passage.text}
        </>
      );
    case 'changed':
      return (
        <>
          {passage.parts.map((part, place) => (
            <Mark key={place} part={part} />
          ))}
        </>
      );
  }
}

/** The label is for the eye; start and end are told to those who hear the text. Spaces at the ends stay outside. */
function Mark({ part: { kind, text } }: { readonly part: WordPart }): ReactElement {
  if (kind === 'kept') return <>{text}</>;
  const Element = kind === 'added' ? 'ins' : 'del';
  const ends = kind === 'added' ? (['startAdded', 'endAdded'] as const) : (['startRemoved', 'endRemoved'] as const);
  return (
    <>
      {text.slice(0, text.length - text.trimStart().length)}
      <Element>
        <span className="sr-only"> {words(`editions.text.${ends[0]}`)} </span>
        <span className="wording-label" aria-hidden="true">
          {words(`editions.text.${kind}`)}
        </span>
        <span aria-hidden="true">{'\u00a0'}</span>
        <span className="wording-words">{text.trim()}</span>
        <span className="sr-only"> {words(`editions.text.${ends[1]}`)} </span>
      </Element>
      {text.slice(text.trimEnd().length)}
    </>
  );
}
