import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { cache, type ReactElement } from 'react';
import { TermPage } from '@/components/library/term-page';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { slug } from '@/lib/kernel/shapes';
import { words } from '@/lib/kernel/words';
import { namesOf } from '@/lib/regions/domain/sheet-names';
import { readRegionSheet } from '@/lib/regions/read-region-sheet';
import { readTerm, type ReadTerm } from '@/lib/regions/read-term';
import { makeCtx } from '@/lib/server/ctx';

type Props = { readonly params: Promise<{ readonly id: string }> };

/** Read once a request. */
const findTerm = cache(async (id: string): Promise<ReadTerm | null> => {
  if (!slug.safeParse(id).success) return null;
  const found = await readTerm(makeCtx(), id);
  return found.ok ? found.value : null;
});

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const found = await findTerm((await params).id);
  if (found === null) return {};
  const said = { name: found.term.name, region: found.sheet.name };
  return { title: words('library.term.titleOf', said), description: words('library.term.description', said) };
}

export default async function TermOfIdPage({ params }: Props): Promise<ReactElement> {
  const found = await findTerm((await params).id);
  if (found === null) notFound();
  const ctx = makeCtx();
  const home = await readRegionSheet(ctx, { code: found.sheet.code });
  return <TermPage {...found} names={namesOf(home.ok ? [home.value, ...home.value.above] : [])} today={calendarDateOf(ctx.now)} />;
}
