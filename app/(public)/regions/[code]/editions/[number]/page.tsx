import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { cache, type ReactElement } from 'react';
import { Panel } from '@/components/ui/panel';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { words } from '@/lib/kernel/words';
import { readEdition, type NumberedEdition } from '@/lib/regions/read-edition';
import { regionCode } from '@/lib/regions/schema';
import { makeCtx } from '@/lib/server/ctx';
import { drawSheet } from '../../find-sheet';

type Props = { readonly params: Promise<{ readonly code: string; readonly number: string }> };

const findEdition = cache(async (code: string, number: string): Promise<NumberedEdition | null> => {
  if (!regionCode.safeParse(code).success || !/^[1-9]\d{0,8}$/.test(number)) return null;
  const found = await readEdition(makeCtx(), { code, number: Number(number) });
  return found.ok ? found.value : null;
});

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { code, number } = await params;
  const found = await findEdition(code, number);
  if (found === null) return {};
  const { name, edition } = found.sheet;
  return { title: words('regions.sheet.titleEdition', { name, number: edition }), robots: { index: false } };
}

export default async function EditionPage({ params }: Props): Promise<ReactElement> {
  const { code, number } = await params;
  const found = await findEdition(code, number);
  if (found === null) notFound();
  const { sheet, inUseTo, withdrawn } = found;
  return (
    <>
      {withdrawn === null ? null : <Withdrawn said={words('regions.editions.withdrawn', withdrawn)} />}
      {drawSheet(sheet, { edition: { inUseTo: inUseTo === null ? null : calendarDateOf(inUseTo) } })}
    </>
  );
}

const Withdrawn = ({ said }: { readonly said: string }): ReactElement => (
  <div className="mb-6">
    <Panel colour="ash">
      <p>{said}</p>
    </Panel>
  </div>
);
