import { Fragment, type ReactElement, type ReactNode } from 'react';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import type { ToldSource } from '@/lib/regions/domain/told-rule';

type Note = { readonly id: string; readonly said: ReactNode };
type Text = { readonly [Key in 'versionDate' | 'seenOn' | 'seenVia']?: ToldSource[Key] | undefined };

/** Notes on a source, each a phrase that stands by itself, on a line of their own. Long addresses break where they must. */
function NoteList({ notes }: { readonly notes: readonly Note[] }): ReactElement | null {
  if (notes.length === 0) return null;
  const texts = notes.flatMap(({ said }) => (typeof said === 'string' ? [said] : []));
  if (texts.length === notes.length) return <span className="block text-umber">{texts.join(' · ')}</span>;
  return (
    <span className="block wrap-anywhere text-umber">
      {notes.map(({ id, said }, place) => (
        <Fragment key={id}>
          {place === 0 ? '' : ' · '}
          {said}
        </Fragment>
      ))}
    </span>
  );
}

/** Of a text, whatever it is cited for: its version, when and where it was read. */
export function TextNotes({ text }: { readonly text: Text }): ReactElement | null {
  return <NoteList notes={textNotes(text, true)} />;
}

/**
 * Of one use of a source: its standing too, whether it was read, and whether a passage was kept. `printed`: its text is told here in
 * full, addresses written out on paper; else a numbered list on the page tells it. */
export function CitationNotes({ source, printed }: { readonly source: ToldSource; readonly printed: boolean }): ReactElement | null {
  return (
    <NoteList
      notes={[
        { id: 'standing', said: words(`regions.source.${source.standing}`) },
        ...(printed ? textNotes(source, true) : seenPlainly(source)),
        ...(source.evidence === 'memory' ? [{ id: 'memory', said: words('regions.source.memory') }] : []),
        ...(printed && source.passage === undefined ? [{ id: 'passage', said: words('regions.source.noPassage') }] : []),
      ]}
    />
  );
}

/** Of a text on a long page: the day it was read, and whether that was a copy. */
export function BriefNotes({ text: { seenOn, seenVia } }: { readonly text: Text }): ReactElement | null {
  if (seenOn === undefined) return null;
  const said = words(seenVia === undefined ? 'regions.source.seenOn' : 'regions.source.seenInCopy', { date: sayDate(seenOn) });
  return <span className="block text-umber">{said}</span>;
}

/** Where the numbered list on the page has the rest of it: the day alone. */
const seenPlainly = ({ seenOn }: ToldSource): readonly Note[] =>
  seenOn === undefined ? [] : [{ id: 'seen', said: words('regions.source.seenOn', { date: sayDate(seenOn) }) }];

function textNotes({ versionDate, seenOn, seenVia }: Text, printed: boolean): readonly Note[] {
  return [
    ...(versionDate === undefined ? [] : [{ id: 'version', said: words('regions.source.version', { version: versionDate }) }]),
    ...(seenOn === undefined
      ? []
      : [
          {
            id: 'seen',
            said: words.rich('regions.source.seen', { date: sayDate(seenOn), day: (said) => <time dateTime={seenOn}>{said}</time> }),
          },
        ]),
    ...(seenVia === undefined
      ? []
      : [{ id: 'via', said: words.rich('regions.source.via', { copy: () => <Copy text={seenVia} printed={printed} /> }) }]),
  ];
}

const ADDRESS = /(https?:\/\/[^\s;)]+)/;

/** Where a copy was read. An address in it leads there under the name of its site; on paper it is written out. */
function Copy({ text, printed }: { readonly text: string; readonly printed: boolean }): ReactElement {
  return (
    <>
      {text.split(ADDRESS).map((part, place) => {
        const site = ADDRESS.test(part) ? new URL(part).host : null;
        if (site === null) return <Fragment key={place}>{part}</Fragment>;
        return (
          <Fragment key={place}>
            <a href={part} className={printed ? 'address-in-print' : undefined}>
              {site}
            </a>
          </Fragment>
        );
      })}
    </>
  );
}
