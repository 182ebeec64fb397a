import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { Caution } from '@/components/checks/caution';
import { SubstanceLimitsTable } from '@/components/regions/substance-limits';
import { LinkButton } from '@/components/ui/link-button';
import { PageHeading } from '@/components/ui/page-heading';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { words } from '@/lib/kernel/words';
import { SUBSTANCES } from '@/lib/readings/domain/row-words';
import { saySubstance } from '@/lib/regions/domain/figure-words';
import { earliestSeen } from '@/lib/regions/domain/sheet-reading';
import { listSubstanceLimits } from '@/lib/regions/list-substance-limits';
import { makeCtx } from '@/lib/server/ctx';

type Props = { readonly params: Promise<{ readonly symbol: string }> };

/** Addresses are in lower case: "pb". */
const symbolOf = (address: string): string | null => SUBSTANCES.find((symbol) => symbol.toLowerCase() === address) ?? null;

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const symbol = symbolOf((await params).symbol);
  if (symbol === null) return {};
  const name = saySubstance(symbol);
  return { title: words('readings-page.substance.title', { name }), description: words('readings-page.substance.description', { name }) };
}

export default async function SubstancePage({ params }: Props): Promise<ReactElement> {
  const symbol = symbolOf((await params).symbol);
  if (symbol === null) notFound();
  const ctx = makeCtx();
  const limits = await listSubstanceLimits(ctx, symbol);
  const name = saySubstance(symbol);
  const rules = limits.places.flatMap(({ rows }) => rows.map(({ rule }) => rule));
  return (
    <>
      <PageHeading>{words('readings-page.substance.title', { name })}</PageHeading>
      <p className="mt-4 max-w-text">{words('readings-page.substance.lead', { name })}</p>
      <div className="mt-4 max-w-text">
        <Caution seenOn={earliestSeen(rules) ?? calendarDateOf(ctx.now)} />
      </div>
      <SubstanceLimitsTable limits={limits} name={name} />
      <p className="not-in-print mt-8">
        <LinkButton kind="plain" href="/readings">
          {words('readings-page.substance.readings')}
        </LinkButton>
      </p>
    </>
  );
}
