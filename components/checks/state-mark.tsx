import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';

export type State = 'applies' | 'not-settled' | 'treat-as-applying' | 'does-not-apply' | 'sources-disagree' | 'withdrawn';

const COLOUR: Readonly<Record<State, string>> = {
  applies: 'text-celadon',
  'not-settled': 'text-ash',
  'treat-as-applying': 'text-celadon',
  'does-not-apply': 'text-umber',
  'sources-disagree': 'text-ash',
  withdrawn: 'text-umber',
};

const HALF_UP = 'M3,9a6,6 0 0 1 12,0';
const HALF_DOWN = 'M3,9a6,6 0 0 0 12,0';

/** A ring of 18 pixels, told apart by its shape alone. */
function Ring({ state }: { readonly state: State }): ReactElement {
  switch (state) {
    case 'applies':
      return <circle cx="9" cy="9" r="6" strokeWidth="4" />;
    case 'not-settled':
      return <circle cx="9" cy="9" r="6.5" strokeWidth="2.6" pathLength="100" strokeDasharray="15 10" strokeDashoffset="-5" />;
    case 'treat-as-applying':
      return (
        <>
          <path d={HALF_UP} strokeWidth="4" />
          <path d={HALF_DOWN} strokeWidth="1.4" />
        </>
      );
    case 'does-not-apply':
      return <circle cx="9" cy="9" r="6.5" strokeWidth="1.4" />;
    case 'sources-disagree':
      return (
        <>
          <path d={HALF_UP} strokeWidth="2.6" transform="translate(-1.6 -0.8)" />
          <path d={HALF_DOWN} strokeWidth="2.6" transform="translate(1.6 0.8)" />
        </>
      );
    case 'withdrawn':
      return (
        <>
          <circle cx="9" cy="9" r="6.5" strokeWidth="1.8" />
          <path d="M1,9H17" strokeWidth="2.2" />
        </>
      );
  }
}

/** How a rule stands for a piece: mark and word, never one without the other. */
export function StateMark({ state }: { readonly state: State }): ReactElement {
  return (
    <span className="state">
      <svg width="18" height="18" viewBox="0 0 18 18" fill="none" stroke="currentColor" aria-hidden="true" className={COLOUR[state]}>
        <Ring state={state} />
      </svg>
      {words(`site.states.${state}`)}
    </span>
  );
}
