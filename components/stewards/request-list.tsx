import type { ReactElement } from 'react';
import type { RequestState } from '@/lib/accounts/domain/role-request';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';

type Request = { readonly id: string; readonly state: RequestState; readonly madeAt: Date; readonly answeredAt: Date | null };

function sayState({ state, madeAt, answeredAt }: Request): string {
  const on = sayDate(calendarDateOf(answeredAt ?? madeAt));
  return state === 'waiting' ? words('stewards.request.waiting', { on }) : words('stewards.request.ended', { state, on });
}

/** What one maker has asked for, the newest first. */
export function RequestList({ requests }: { readonly requests: readonly Request[] }): ReactElement | null {
  if (requests.length === 0) return null;
  return (
    <section className="mt-12" aria-labelledby="asked">
      <h2 id="asked">{words('stewards.account.requests')}</h2>
      <ul className="mt-3" role="list">
        {requests.map((request) => (
          <li key={request.id} className="py-1">
            <a href={`/stewards/requests/${request.id}`}>{sayState(request)}</a>
          </li>
        ))}
      </ul>
    </section>
  );
}
