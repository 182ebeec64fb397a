import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';
import type { NumberedSource } from '@/lib/regions/domain/cited-sources';
import { SourceTitle } from './source-details';
import { TextNotes } from './source-notes';

/** Every text a page cites, numbered, each once. On paper its address stands here and nowhere else. */
export function CitedList({ list }: { readonly list: readonly NumberedSource[] }): ReactElement {
  return (
    <ol className="sources" aria-label={words('regions.source.list')}>
      {list.map(({ number, source: { title, publisher, identifier, url, ...text } }) => (
        <li key={number} id={`source-${String(number)}`} className="keep-together wrap-anywhere">
          <SourceTitle title={title} url={url} />. <bdi>{publisher}</bdi>. {identifier === undefined ? null : <bdi>{identifier}</bdi>}
          <TextNotes text={text} />
        </li>
      ))}
    </ol>
  );
}
