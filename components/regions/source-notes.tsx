import { Fragment, type ReactElement, type ReactNode } from 'react';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import type { ToldSource } from '@/lib/regions/domain/told-rule';

type Note = { readonly id: string; readonly said: ReactNode };
type Text = { readonly [Key in 'versionDate' | 'seenOn' | 'seenVia']?: ToldSource[Key] | undefined };

/** Notes on a source, each a phrase that stands by itself. Long addresses break where they must. */
function NoteList({ notes }: { readonly notes: readonly Note[] }): ReactElement | null {
  if (notes.length === 0) return null;
  return (
    <ul className="flex flex-wrap gap-x-4 wrap-anywhere text-umber">
      {notes.map(({ id, said }) => (
        <li key={id}>{said}</li>
      ))}
    </ul>
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
        ...textNotes(printed ? source : { seenOn: source.seenOn }, printed),
        ...(source.evidence === 'memory' ? [{ id: 'memory', said: words('regions.source.memory') }] : []),
        ...(source.passage === undefined ? [{ id: 'passage', said: words('regions.source.noPassage') }] : []),
      ]}
    />
  );
}

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
            <a href={part}>{site}</a>
            {printed ? <span className="only-print"> ({part})</span> : null}
          </Fragment>
        );
      })}
    </>
  );
}
