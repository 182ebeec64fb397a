import type { ReactElement, ReactNode } from 'react';
import { Panel, type PanelColour } from '@/components/ui/panel';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate, sayList } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { isWaiting } from '@/lib/regions/domain/amendment';
import type { AlsoOpen, Review } from '@/lib/regions/domain/amendment-view';
import type { LineNames } from './anchors';

type Props = { readonly review: Review; readonly names: LineNames };
type Note = { readonly id: string; readonly colour: PanelColour; readonly said: ReactNode };

/** What to know before reading: that it is one's own, that nobody can give the second approval, that others are at the same rules. */
export function ReviewNotes({ review, names }: Props): ReactElement | null {
  const notes = notesOf(review);
  if (notes.length === 0 && review.alsoOpen.length === 0) return null;
  return (
    <div className="mt-6 flex max-w-text flex-col gap-4">
      {notes.map(({ id, colour, said }) => (
        <Panel key={id} colour={colour}>
          <p>{said}</p>
        </Panel>
      ))}
      {review.alsoOpen.length === 0 ? null : <OthersUnderWay others={review.alsoOpen} names={names} />}
    </div>
  );
}

function notesOf(review: Review): readonly Note[] {
  const { state } = review.amendment;
  if (!isWaiting(state)) return [{ id: 'over', colour: 'plain', said: <Over review={review} /> }];
  return NOTES.flatMap(([id, colour, holds]) => (holds(review) ? [note(id, colour)] : []));
}

type NoteId = 'own' | 'gaveIt' | 'alone' | 'noneLeft' | 'held';

const isAlone = ({ needed, othersLeft }: Review): boolean => needed === 2 && othersLeft === 0;

/** What there is to mind while it waits, and when. */
const NOTES: readonly (readonly [id: NoteId, colour: PanelColour, holds: (review: Review) => boolean])[] = [
  ['own', 'ash', ({ isOwn }) => isOwn],
  ['gaveIt', 'celadon', ({ gaveIt }) => gaveIt],
  ['alone', 'ash', (review) => isAlone(review) && review.given === 0 && !review.isOwn],
  ['noneLeft', 'ash', (review) => isAlone(review) && review.gaveIt],
  ['held', 'ash', ({ amendment }) => amendment.state === 'held'],
];

const note = (id: NoteId, colour: PanelColour): Note => ({
  id,
  colour,
  said: words(`review.note.${id}`),
});

/** How it ended, with the way to the edition it became. */
export function Over({ review: { amendment, name } }: { readonly review: Review }): ReactElement {
  const { state, editionNumber, region } = amendment;
  if (state !== 'in-use' || editionNumber === null) return <>{words('review.note.over', { state: words(`review.state.${state}`) })}</>;
  return (
    <>
      {words.rich('review.note.overEdition', {
        number: editionNumber,
        name,
        link: (said) => <a href={`/regions/${region}/editions/${String(editionNumber)}`}>{said}</a>,
      })}
    </>
  );
}

function OthersUnderWay({ others, names }: { readonly others: readonly AlsoOpen[]; readonly names: LineNames }): ReactElement {
  return (
    <Panel colour="ash">
      <p>{words('review.note.alsoOpen', { count: others.length })}:</p>
      <ul className="list-disc ps-6">
        {others.map(({ since, state, items }, place) => (
          <li key={place}>
            {words('review.note.alsoOpenLine', {
              date: sayDate(calendarDateOf(since)),
              state: words(`review.state.${state}`),
              items: sayList(items.map((item) => names.get(item) ?? item)),
            })}
          </li>
        ))}
      </ul>
    </Panel>
  );
}
