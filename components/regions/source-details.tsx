import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';
import { alikeTogether } from '@/lib/regions/domain/cited-sources';
import type { ToldSource } from '@/lib/regions/domain/told-rule';
import { CitationNotes } from './source-notes';

type Props = {
  readonly sources: readonly ToldSource[];
  /** Where the page has a numbered list of all its sources: the number in it. Then its title and address stand only there. */
  readonly numberOf?: ((source: ToldSource) => number) | undefined;
};

/** What a rule rests on: text, place in it, passage in its language, standing, when and where it was read. */
export function SourceDetails({ sources, numberOf }: Props): ReactElement {
  if (numberOf === undefined) {
    return (
      <ol className="sources" aria-label={words('regions.source.list')}>
        {sources.map((source, place) => (
          <li key={place} className="keep-together">
            <FullSource source={source} />
          </li>
        ))}
      </ol>
    );
  }
  return (
    <ul className="flex flex-col gap-2 font-sans text-plain">
      {alikeTogether(sources).map((source, place) => (
        <li key={place} className="keep-together">
          <SourceLink number={numberOf(source)} locator={source.locator} />. <cite>{source.title}</cite>
          <Passage source={source} />
          <CitationNotes source={source} printed={false} />
        </li>
      ))}
    </ul>
  );
}

function FullSource({ source }: { readonly source: ToldSource }): ReactElement {
  const { title, url, identifier, locator, publisher } = source;
  return (
    <>
      <SourceTitle title={title} url={url} />
      {identifier === undefined ? null : (
        <>
          , <bdi>{identifier}</bdi>
        </>
      )}
      {locator === undefined ? null : <>, {locator}</>}. <bdi>{publisher}</bdi>.
      <Passage source={source} />
      <CitationNotes source={source} printed />
    </>
  );
}

/** The quoted lines, in their own language. */
function Passage({ source: { passage, passageLang } }: { readonly source: ToldSource }): ReactElement | null {
  if (passage === undefined) return null;
  return (
    <blockquote lang={passageLang} className="my-1 border-s-2 border-rule ps-3 font-serif">
      <p>{words('regions.source.passage', { passage })}</p>
    </blockquote>
  );
}

type TitleProps = { readonly title: string; readonly url?: string | undefined };

/** The title of a text, a link where we have its address; on paper the address is written out. */
export function SourceTitle({ title, url }: TitleProps): ReactElement {
  if (url === undefined) return <cite>{title}</cite>;
  return (
    <a href={url} className="address-in-print">
      <cite>{title}</cite>
    </a>
  );
}

type LinkProps = { readonly number: number; readonly locator?: string | undefined };

/** To the source in the page's numbered list. */
export function SourceLink({ number, locator }: LinkProps): ReactElement {
  const said = locator === undefined ? words('regions.rule.cited', { number }) : words('regions.rule.citedIn', { number, locator });
  return <a href={`#source-${String(number)}`}>{said}</a>;
}
