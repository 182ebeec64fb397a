'use client';

import { useEffect, useState, type ReactElement, type ReactNode } from 'react';
import { useFormStatus } from 'react-dom';

type Props = { readonly children: ReactNode; readonly busy: string; readonly kind?: 'primary' | 'plain' };

const PATIENCE_MS = 1000;

/** A button of a form that says after a second that it is still at work. Without script it is a plain button. */
export function SubmitButton({ children, busy, kind = 'primary' }: Props): ReactElement {
  const { pending } = useFormStatus();
  const [slow, setSlow] = useState(false);
  useEffect(() => {
    if (!pending) return;
    const timer = setTimeout(() => {
      setSlow(true);
    }, PATIENCE_MS);
    return () => {
      clearTimeout(timer);
      setSlow(false);
    };
  }, [pending]);
  return (
    <>
      <button type="submit" className={`button button-${kind}`}>
        {slow ? busy : children}
      </button>
      <span role="status" className="sr-only">
        {slow ? busy : ''}
      </span>
    </>
  );
}
