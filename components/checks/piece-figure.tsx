import type { ReactElement } from 'react';
import { SectionDrawing } from '@/components/pieces/section-drawing';
import { sectionWords } from '@/components/pieces/section-words';
import type { Answers } from '@/lib/checks/domain/knowledge';
import { pieceShape } from './piece-shape';

/** The piece as known so far, drawn; its patterns explained in words below. */
export function PieceFigure({ answers }: { readonly answers: Answers }): ReactElement {
  const shape = pieceShape(answers);
  const said = sectionWords(shape);
  return (
    <figure className="keep-together">
      <SectionDrawing {...shape} words={said} />
      <figcaption className="mt-2 font-sans text-small text-umber">
        <p>{said.title}</p>
        <ul>
          {said.key.map((line) => (
            <li key={line}>{line}</li>
          ))}
        </ul>
      </figcaption>
    </figure>
  );
}
