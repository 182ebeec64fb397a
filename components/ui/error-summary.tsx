import type { ReactElement } from 'react';
import { FocusOnRefusal } from './focus-on-refusal';

type Props = {
  /** By number: "Two answers need another look". Also put before the page's title. */
  readonly heading: string;
  /** In the order of the page. `id` is the field's own. */
  readonly faults: readonly { readonly id: string; readonly said: string }[];
  readonly tries: number;
};

const ID = 'faults';

/** All that needs mending, linked to where; takes the focus as it appears. Without script `autofocus` does that. */
export function ErrorSummary({ heading, faults, tries }: Props): ReactElement {
  return (
    <div
      id={ID}
      className="panel panel-copper keep-together mb-6"
      role="group"
      aria-labelledby={`${ID}-heading`}
      tabIndex={-1}
      data-arrival=""
      // The one place where it helps: the page came back because of this.
      autoFocus
    >
      <h2 id={`${ID}-heading`} className="text-lead">
        {heading}
      </h2>
      <ul className="mt-2">
        {faults.map(({ id, said }) => (
          <li key={id} className="py-1">
            <a href={`#${id}`}>{said}</a>
          </li>
        ))}
      </ul>
      <FocusOnRefusal target={ID} titlePrefix={`${heading} – `} tries={tries} />
    </div>
  );
}
