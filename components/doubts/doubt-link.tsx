import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';

type Props = { readonly rule: { readonly id: string; readonly title: string } };

/** The way from a rule to the form that doubts it. Its full name says which rule, since a page holds many. */
export function DoubtLink({ rule: { id, title } }: Props): ReactElement {
  return (
    <a className="not-in-print inline-block py-2" href={`/rules/${id}/doubt`} aria-label={words('doubts.linkOf', { title })}>
      {words('doubts.link')}
    </a>
  );
}
