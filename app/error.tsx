'use client';

import type { ReactElement } from 'react';
import { PageTitle } from '@/components/ui/page-title';
import broken from '@/content/messages/en/broken.json';

type Props = { readonly error: unknown; readonly retry: () => void };

const numberOf = (error: unknown): string | null =>
  typeof error === 'object' && error !== null && 'digest' in error && typeof error.digest === 'string' ? error.digest : null;

export default function ErrorPage({ error, retry }: Props): ReactElement {
  const number = numberOf(error);
  return (
    <div className="max-w-text">
      <PageTitle title={broken.titleOf} />
      <h1 tabIndex={-1}>{broken.title}</h1>
      <p className="mt-4">{broken.lead}</p>
      <p className="mt-3">{broken.mend}</p>
      {number === null ? null : <p className="mt-3 font-sans">{number}</p>}
      <p className="mt-6 flex flex-wrap items-center gap-6">
        <button type="button" className="button button-primary" onClick={retry}>
          {broken.again}
        </button>
        <a href="/">{broken.home}</a>
        <a href="/contact">{broken.help}</a>
      </p>
    </div>
  );
}
