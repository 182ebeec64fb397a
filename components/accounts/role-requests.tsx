import type { ReactElement } from 'react';
import type { RoleRequest } from '@/lib/accounts/domain/role-request';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';

function sayEnd({ state, answeredAt, madeAt }: RoleRequest): string {
  const on = sayDate(calendarDateOf(answeredAt ?? madeAt));
  return state === 'waiting' ? words('bench.ask.waiting', { on }) : words(`bench.ask.${state}`, { on });
}

/** Earlier requests for a role, and what a steward wrote. */
export function RoleRequests({ requests }: { readonly requests: readonly RoleRequest[] }): ReactElement | null {
  if (requests.length === 0) return null;
  return (
    <section className="mt-8" aria-labelledby="earlier">
      <h2 id="earlier">{words('bench.ask.earlier')}</h2>
      <ul role="list">
        {requests.map((request) => (
          <li key={request.id} className="py-3">
            <p>{sayEnd(request)}</p>
            {request.answer === null ? null : (
              <p>
                {words('bench.ask.answer')} {request.answer}
              </p>
            )}
          </li>
        ))}
      </ul>
    </section>
  );
}
