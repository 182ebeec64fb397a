import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';
import type { Status } from '@/lib/readings/domain/decision';

const COLOUR: Readonly<Record<Status, string>> = {
  within: 'text-celadon',
  over: 'text-copper',
  'test-more': 'text-ash',
  'cannot-tell': 'text-umber',
};

/** A line for the limit, and where the figure lies: told apart by shape alone. */
function Shape({ status }: { readonly status: Status }): ReactElement {
  switch (status) {
    case 'within':
      return (
        <>
          <path d="M1,6H17" strokeWidth="2.2" />
          <circle cx="9" cy="13" r="3" fill="currentColor" />
        </>
      );
    case 'over':
      return (
        <>
          <path d="M1,12H17" strokeWidth="2.2" />
          <path d="M5.5,8L9,2.5L12.5,8Z" fill="currentColor" />
        </>
      );
    case 'test-more':
      return (
        <>
          <path d="M1,9H17" strokeWidth="2.2" />
          <circle cx="4" cy="4" r="1.6" fill="currentColor" />
          <circle cx="9" cy="14" r="1.6" fill="currentColor" />
          <circle cx="14" cy="4" r="1.6" fill="currentColor" />
        </>
      );
    case 'cannot-tell':
      return <circle cx="9" cy="9" r="6.5" strokeWidth="2.6" pathLength="100" strokeDasharray="15 10" strokeDashoffset="-5" />;
  }
}

/** How figures stand against a limit: mark and word, never one without the other. */
export function StatusMark({ status }: { readonly status: Status }): ReactElement {
  return (
    <span className="state">
      <svg width="18" height="18" viewBox="0 0 18 18" fill="none" stroke="currentColor" aria-hidden="true" className={COLOUR[status]}>
        <Shape status={status} />
      </svg>
      {words(`readings-page.status.${status}`)}
    </span>
  );
}
