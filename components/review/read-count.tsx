'use client';

import { useEffect, useState, type ReactElement } from 'react';
import { TICKED } from './tick';

/** How many sources are ticked: `says` has the words for each count from none on. */
export function ReadCount({ read, says }: { readonly read: number; readonly says: readonly string[] }): ReactElement {
  const [count, setCount] = useState(read);
  useEffect(() => {
    const recount = (): void => {
      setCount(document.querySelectorAll('[data-tick][aria-pressed="true"]').length);
    };
    window.addEventListener(TICKED, recount);
    return () => {
      window.removeEventListener(TICKED, recount);
    };
  }, []);
  return (
    <p role="status" className="font-strong">
      {says[count] ?? says.at(-1)}
    </p>
  );
}
