import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';

type Props = { readonly rule: { readonly id: string; readonly title: string; readonly region: string } };

/** The way from a rule to the form that changes it. Its full name says which rule, since a page holds many. */
export function AmendLink({ rule: { id, title, region } }: Props): ReactElement {
  return (
    <a
      className="not-in-print inline-block py-2"
      href={`/regions/${region}/amend?item=rules/${id}`}
      aria-label={words('amend.begin.linkRuleOf', { title })}
    >
      {words('amend.begin.linkRule')}
    </a>
  );
}
