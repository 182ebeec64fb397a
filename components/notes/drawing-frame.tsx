import { useId, type ReactElement, type ReactNode } from 'react';
import { wordsAt } from '@/lib/kernel/words';

/** The words of a drawing. Throws where the message file lacks them; a test draws every one. */
export function drawingWords(name: string, part: string): string {
  const text = wordsAt(`notes.draw.${name}.${part}`);
  if (text === null) throw new Error(`content/messages/en/notes.json has no draw.${name}.${part}`);
  return text;
}

type FrameProps = { readonly name: string; readonly height: number; readonly children: ReactNode };

export const DRAWING_WIDTH = 320;

/** A drawing with its title and description for whoever does not see it. */
export function DrawingFrame({ name, height, children }: FrameProps): ReactElement {
  const id = useId();
  return (
    <svg className="drawing" viewBox={`0 0 ${DRAWING_WIDTH} ${height}`} role="img" aria-labelledby={`${id}t ${id}d`}>
      <title id={`${id}t`}>{drawingWords(name, 'title')}</title>
      <desc id={`${id}d`}>{drawingWords(name, 'about')}</desc>
      {children}
    </svg>
  );
}

type FigureProps = {
  readonly name: string;
  readonly drawing: ReactNode;
  /** What the patterns mean, where there are any. */
  readonly legend?: readonly string[];
  readonly sources?: ReactNode;
};

/** A drawing with its text twin below it, and the numbers of the sources its figures come from. */
export function NoteFigure({ name, drawing, legend = [], sources }: FigureProps): ReactElement {
  return (
    <figure className="note-figure keep-together">
      {drawing}
      <figcaption>
        <strong>{drawingWords(name, 'title')}.</strong> {drawingWords(name, 'about')} {sources}
        {legend.length === 0 ? null : (
          <ul>
            {legend.map((line) => (
              <li key={line}>{line}</li>
            ))}
          </ul>
        )}
      </figcaption>
    </figure>
  );
}
