import type { ReactElement } from 'react';
import { Panel } from '@/components/ui/panel';
import type { FileRefusalKind } from '@/lib/files/domain/file-refusal';
import { words } from '@/lib/kernel/words';
import { HiddenFields } from './hidden-fields';

type Props = {
  readonly submission: string;
  readonly id: string;
  readonly item: string;
  readonly version: number;
  readonly source: string;
  /** This page. */
  readonly back: string;
  /** A page is put with the source already. */
  readonly has: boolean;
  /** One that was just received. */
  readonly file: string | null;
  readonly refused: FileRefusalKind | null;
  readonly attach: (form: FormData) => Promise<void>;
};

/** The page as it was seen: sent by a form of its own, and then put with the source. */
export function PagesSeen(props: Props): ReactElement {
  const { submission, id, item, version, source, back, has, file, refused, attach } = props;
  return (
    <section className="amend-section max-w-text" aria-labelledby="page-seen">
      <h2 id="page-seen">{words('amend.source.page.title')}</h2>
      <p className="mt-2">{words(has ? 'amend.source.page.has' : 'amend.source.page.none')}</p>
      {refused === null ? null : (
        <div className="mt-3">
          <Panel colour="copper">
            <p role="alert">{words(`files.refused.${refused}`)}</p>
          </Panel>
        </div>
      )}
      {file === null ? null : (
        <form action={attach} className="mt-4">
          <Panel colour="celadon">
            <p role="status">{words('amend.source.page.received')}</p>
            <HiddenFields values={{ key: submission, id, item, file, version: String(version) }} />
            <p className="mt-2">
              <button type="submit" className="button button-primary">
                {words('amend.source.page.put')}
              </button>
            </p>
          </Panel>
        </form>
      )}
      <form action="/api/files" method="post" encType="multipart/form-data" className="mt-4 flex flex-col gap-3">
        <HiddenFields values={{ key: submission, back, amendment: id, source, version: String(version) }} />
        <label htmlFor="file" className="font-sans text-plain font-strong">
          {words('amend.source.page.file')}
        </label>
        <p id="file-hint" className="field-hint">
          {words('files.takes')} {words('amend.source.page.first')}
        </p>
        <input id="file" type="file" name="file" aria-describedby="file-hint" className="amend-file" />
        <div>
          <button type="submit" className="button button-plain">
            {words('amend.source.page.send')}
          </button>
        </div>
      </form>
    </section>
  );
}
