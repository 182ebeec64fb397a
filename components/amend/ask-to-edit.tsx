import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';

/** A maker is told what an editor is, and how to ask to be one. */
export function AskToEdit({ heading }: { readonly heading: ReactElement }): ReactElement {
  return (
    <div className="max-w-text">
      {heading}
      <p className="mt-4">{words('amend.begin.maker')}</p>
      <p className="mt-4">
        <a className="button button-primary" href="/bench/ask">
          {words('amend.begin.ask')}
        </a>
      </p>
    </div>
  );
}
