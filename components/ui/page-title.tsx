'use client';

import { useEffect } from 'react';

/** Names a page that was drawn in place of another, whose title is already set. */
export function PageTitle({ title }: { readonly title: string }): null {
  useEffect(() => {
    document.title = title;
  }, [title]);
  return null;
}
