import type { ReactElement, ReactNode } from 'react';
import { words } from '@/lib/kernel/words';

/** A text as a reader will meet it, as it was kept last. */
export function TextPreview({ children }: { readonly children: ReactNode }): ReactElement {
  return (
    <section className="amend-section" aria-labelledby="text-preview">
      <h2 id="text-preview">{words('amend.text.preview')}</h2>
      <p className="field-hint">{words('amend.text.previewHint')}</p>
      <div className="prose mt-4">{children}</div>
    </section>
  );
}
