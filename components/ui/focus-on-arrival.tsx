'use client';

import { usePathname, useSearchParams } from 'next/navigation';
import { useEffect, useRef } from 'react';

/** In the root layout: after a move without a full load the summary of faults, or else the heading, takes the focus. */
export function FocusOnArrival(): null {
  const place = `${usePathname()}?${useSearchParams().toString()}`;
  const last = useRef(place);
  useEffect(() => {
    // A full load is left to the browser, so that the skip link stays first.
    if (last.current === place) return;
    last.current = place;
    const target = document.querySelector<HTMLElement>('[data-arrival]') ?? document.querySelector<HTMLElement>('main h1');
    target?.setAttribute('tabindex', '-1');
    target?.focus();
  }, [place]);
  return null;
}
