import type { ReactElement } from 'react';
import { Instant } from '@/components/stewards/instant';
import { Disclosure } from '@/components/ui/disclosure';
import { Panel } from '@/components/ui/panel';
import type { Break } from '@/lib/day-book/domain/entry';
import { words } from '@/lib/kernel/words';

type Props = { readonly lines: number; readonly written: number; readonly checkedAt: Date | null; readonly break: Break | null };

/** Whether the lines stand as they were written, up to which, and what that does not show. */
export function ChainPanel(state: Props): ReactElement {
  return (
    <section aria-labelledby="chain" className="mt-12 max-w-text">
      <h2 id="chain">{words('day-book.chain.label')}</h2>
      <div className="mt-3">{state.break === null ? <Holds {...state} /> : <Broken found={state.break} />}</div>
      <div className="mt-4">
        <Disclosure summary={words('day-book.chain.howTitle')}>
          <p>{words('day-book.chain.how')}</p>
          <p className="mt-3">{words('day-book.chain.limit')}</p>
        </Disclosure>
      </div>
    </section>
  );
}

function Holds({ lines, written, checkedAt }: Props): ReactElement {
  return (
    <Panel colour="celadon">
      <p>{words('day-book.chain.holds', { lines })}</p>
      {written > lines ? <p>{words('day-book.chain.behind', { written })}</p> : null}
      {checkedAt === null ? null : <p>{words.rich('day-book.chain.checked', { on: () => <Instant at={checkedAt} /> })}</p>}
    </Panel>
  );
}

function Broken({ found }: { readonly found: Break }): ReactElement {
  return (
    <Panel colour="copper">
      <p className="font-strong">{words(`day-book.chain.broken.${found.why}`, { number: found.number })}</p>
      <p>{words.rich('day-book.chain.brokenLead', { link: (said) => <a href="/contact">{said}</a> })}</p>
    </Panel>
  );
}
