import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { Caution } from '@/components/checks/caution';
import { HeardClaimSection } from '@/components/library/heard-claim';
import { PageHeading } from '@/components/ui/page-heading';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { words } from '@/lib/kernel/words';
import { readHeardClaims } from '@/lib/regions/read-heard-claims';
import { makeCtx } from '@/lib/server/ctx';

export const metadata: Metadata = { title: words('heard.title'), description: words('heard.description') };

export default async function HeardPage(): Promise<ReactElement> {
  const ctx = makeCtx();
  const claims = await readHeardClaims(ctx);
  return (
    <>
      <PageHeading>{words('heard.title')}</PageHeading>
      <p className="mt-4 max-w-text">{words('heard.lead')}</p>
      <nav aria-labelledby="claims" className="mt-6 max-w-text">
        <h2 id="claims" className="text-read">
          {words('heard.contents')}
        </h2>
        <ul className="mt-2 list-disc ps-6">
          {claims.map(({ id, heard }) => (
            <li key={id}>
              <a href={`#${id}`}>
                <q>{heard}</q>
              </a>
            </li>
          ))}
        </ul>
      </nav>
      {claims.map((claim) => (
        <HeardClaimSection key={claim.id} claim={claim} />
      ))}
      <p className="mt-12 max-w-text">
        {words('heard.more')} <a href="/contact">{words('heard.ask')}</a>
      </p>
      <div className="mt-6 max-w-text">
        <Caution seenOn={calendarDateOf(ctx.now)} />
      </div>
    </>
  );
}
