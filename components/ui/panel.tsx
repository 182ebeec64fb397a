import type { ReactElement, ReactNode } from 'react';

export type PanelColour = 'plain' | 'celadon' | 'ash' | 'copper' | 'cobalt';
type Props = { readonly colour?: PanelColour; readonly label?: string; readonly children: ReactNode };

/** A wash of colour with a bar at the start. The colour says nothing that the words do not. A label makes it a landmark. */
export function Panel({ colour = 'plain', label, children }: Props): ReactElement {
  const className = `panel panel-${colour}`;
  return label === undefined ? (
    <div className={className}>{children}</div>
  ) : (
    <section className={className} aria-label={label}>
      {children}
    </section>
  );
}
