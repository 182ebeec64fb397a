import type { ReactElement, ReactNode } from 'react';

export type SourceEntry = {
  readonly id: string;
  readonly title: string;
  /** Of the title and the passage, when they are not in the page's language. */
  readonly lang?: string | undefined;
  readonly url?: string | undefined;
  readonly publisher: string;
  /** Where in it: "Annex I, point 2". */
  readonly locator?: string | undefined;
  readonly passage?: string | undefined;
  readonly passageLang?: string | undefined;
  /** Standing, the day it was read, the version: each a phrase that stands by itself. */
  readonly notes: readonly ReactNode[];
};

/** Sources, numbered. In print each address stands written out, once. */
export function SourceList({ label, sources }: { readonly label: string; readonly sources: readonly SourceEntry[] }): ReactElement {
  return (
    <ol className="sources" aria-label={label}>
      {sources.map((source) => (
        <li key={source.id} className="keep-together">
          <Title source={source} />
          {source.locator === undefined ? null : <>, {source.locator}</>}. <bdi>{source.publisher}</bdi>.
          {source.passage === undefined ? null : (
            <blockquote lang={source.passageLang}>
              <p>{source.passage}</p>
            </blockquote>
          )}
          <ul className="flex flex-wrap gap-4 text-umber">
            {source.notes.map((note, place) => (
              <li key={place}>{note}</li>
            ))}
          </ul>
        </li>
      ))}
    </ol>
  );
}

function Title({ source: { title, lang, url } }: { readonly source: SourceEntry }): ReactElement {
  const cite = <cite lang={lang}>{title}</cite>;
  if (url === undefined) return cite;
  return (
    <>
      <a href={url}>{cite}</a>
      <span className="only-print"> ({url})</span>
    </>
  );
}
