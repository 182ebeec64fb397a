'use client';

import { useEffect } from 'react';

type Props = { readonly target: string; readonly titlePrefix: string; readonly tries: number };

/** Beside a summary of faults: gives it the focus at each refusal and puts its words before the page's title. */
export function FocusOnRefusal({ target, titlePrefix, tries }: Props): null {
  useEffect(() => {
    document.getElementById(target)?.focus();
    const title = document.title;
    document.title = titlePrefix + title;
    return () => {
      if (document.title === titlePrefix + title) document.title = title;
    };
  }, [target, titlePrefix, tries]);
  return null;
}
