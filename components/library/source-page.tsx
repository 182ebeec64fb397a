import type { ReactElement } from 'react';
import { StrengthLine } from '@/components/regions/strength-line';
import { TextNotes } from '@/components/regions/source-notes';
import { DefinitionList } from '@/components/ui/definition-list';
import { PageHeading } from '@/components/ui/page-heading';
import { words } from '@/lib/kernel/words';
import { readingOf, type CitedText, type Resting } from '@/lib/regions/domain/cited-text';
import { SaidReading } from './source-index';

/** A text in full: what it is, when it was read, and what of which sheet rests on it. */
export function SourcePage({ text }: { readonly text: CitedText }): ReactElement {
  const { source, resting, places } = text;
  return (
    <article className="max-w-text">
      <PageHeading>
        <cite>{source.title}</cite>
      </PageHeading>
      <div className="mt-6">
        <DefinitionList entries={entriesOf(text)} />
      </div>
      {readingOf(text).state === 'not-read' ? <p className="mt-4">{words('library.sources.notReadMeaning')}</p> : null}
      <section className="mt-12" aria-labelledby="resting">
        <h2 id="resting">{words('library.sources.resting')}</h2>
        <p className="mt-2">{words('library.sources.restingIn', { count: resting.length, places: places.length })}</p>
        {places.map((place) => (
          <PlaceRests key={place.code} place={place} resting={resting.filter((one) => one.place.code === place.code)} />
        ))}
      </section>
      <p className="not-in-print mt-8">
        <a href="/sources">{words('library.sources.all')}</a>
      </p>
      <p className="mt-8 text-umber">{words('library.sources.terms')}</p>
    </article>
  );
}

function entriesOf(text: CitedText): Parameters<typeof DefinitionList>[0]['entries'] {
  const { publisher, identifier, url, versionDate, seenOn, seenVia } = text.source;
  const copy = seenVia === undefined ? null : <TextNotes text={{ seenVia }} />;
  return [
    { id: 'publisher', name: words('library.sources.publisher'), value: <bdi>{publisher}</bdi> },
    ...(identifier === undefined ? [] : [{ id: 'identifier', name: words('library.sources.identifier'), value: <bdi>{identifier}</bdi> }]),
    {
      id: 'url',
      name: words('library.sources.address'),
      value:
        url === undefined ? (
          words('library.sources.noAddress')
        ) : (
          <a href={url} className="wrap-anywhere">
            {url}
          </a>
        ),
    },
    ...(versionDate === undefined ? [] : [{ id: 'version', name: words('library.sources.version'), value: versionDate }]),
    { id: 'read', name: words('library.sources.reading'), value: <SaidReading reading={readingOf(text)} /> },
    ...(copy === null || seenOn === undefined ? [] : [{ id: 'copy', name: words('library.sources.copy'), value: copy }]),
  ];
}

type PlaceProps = { readonly place: CitedText['places'][number]; readonly resting: readonly Resting[] };

function PlaceRests({ place: { code, name }, resting }: PlaceProps): ReactElement {
  return (
    <section className="mt-6" aria-labelledby={`in-${code}`}>
      <h3 id={`in-${code}`}>
        <a href={`/regions/${code}`}>{name}</a>
      </h3>
      {resting.length === 0 ? <p className="mt-2">{words('library.sources.nothing')}</p> : null}
      <ul className="mt-2">
        {resting.map((one, place) => (
          <li key={`${one.id} ${String(place)}`} className="keep-together border-b border-rule py-3">
            <Rest rest={one} />
          </li>
        ))}
      </ul>
    </section>
  );
}

function Rest({ rest }: { readonly rest: Resting }): ReactElement {
  const { id, title, citation } = rest;
  const { locator, passage, passageLang, standing, evidence } = citation;
  return (
    <>
      {rest.kind === 'rule' ? (
        <a href={`/rules/${id}`}>{title}</a>
      ) : (
        <a href={`/terms/${id}`}>{words('library.sources.term', { name: title })}</a>
      )}
      {locator === undefined ? null : <span className="block font-sans text-plain text-umber">{locator}</span>}
      {rest.kind === 'rule' ? (
        <StrengthLine strength={rest.strength} standing={standing} evidence={evidence} />
      ) : (
        <p className="font-sans text-plain text-umber">{words(`library.sources.evidence.${evidence}`)}</p>
      )}
      {passage === undefined ? null : (
        <blockquote lang={passageLang} className="my-1 border-s-2 border-rule ps-3">
          <p>{words('regions.source.passage', { passage })}</p>
        </blockquote>
      )}
    </>
  );
}
