import type { ReactElement, ReactNode } from 'react';
import { Panel } from '@/components/ui/panel';

/** What was just done, told by a screen reader as the page comes. */
export function Note({ children }: { readonly children: ReactNode }): ReactElement {
  return (
    <div role="status" className="mb-6">
      <Panel colour="celadon">
        <p>{children}</p>
      </Panel>
    </div>
  );
}
