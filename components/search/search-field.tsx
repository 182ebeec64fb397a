'use client';

import { lazy, Suspense, useState, type ReactElement } from 'react';

const Suggestions = lazy(async () => ({ default: (await import('./suggestions')).Suggestions }));

type Props = { readonly id: string; readonly asked: string; readonly describedBy?: string | undefined };

/** A field for a question. What suggests is fetched when the field is entered, so that a page that is only read does without. */
export function SearchField({ id, asked, describedBy }: Props): ReactElement {
  const [field, setField] = useState<HTMLInputElement | null>(null);
  return (
    <div className="search-field">
      <input
        className="control"
        type="search"
        id={id}
        name="q"
        maxLength={200}
        autoComplete="off"
        defaultValue={asked}
        aria-describedby={describedBy}
        onFocus={(event) => {
          setField(event.currentTarget);
        }}
      />
      {field === null ? null : (
        <Suspense fallback={null}>
          <Suggestions field={field} />
        </Suspense>
      )}
    </div>
  );
}
