import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';
import type { NumberedSource } from '@/lib/regions/domain/cited-sources';
import { SourceTitle } from './source-details';
import { BriefNotes, TextNotes } from './source-notes';

type Props = {
  readonly list: readonly NumberedSource[];
  /** With the day of reading alone, where the pages of the rules tell the version and the copy. */
  readonly brief?: boolean;
};

/** Every text a page cites, numbered, each once. On paper its address stands here and nowhere else. */
export function CitedList({ list, brief = false }: Props): ReactElement {
  return (
    <ol className="sources" aria-label={words('regions.source.list')}>
      {list.map(({ number, source: { title, publisher, identifier, url, ...text } }) => (
        <li key={number} id={`source-${String(number)}`} className="keep-together wrap-anywhere">
          <SourceTitle title={title} url={url} />. <bdi>{publisher}</bdi>. {identifier === undefined ? null : <bdi>{identifier}</bdi>}
          {brief ? <BriefNotes text={text} /> : <TextNotes text={text} />}
        </li>
      ))}
    </ol>
  );
}
