import type { Metadata } from 'next';
import { notFound, redirect } from 'next/navigation';
import type { ReactElement } from 'react';
import { parseCalendarDate } from '@/lib/kernel/calendar-date';
import { words } from '@/lib/kernel/words';
import { placeWords } from '@/lib/regions/domain/condition-words';
import { regionCode } from '@/lib/regions/schema';
import { countryCodes } from '@/lib/server/world-map';
import { drawKeepers } from './draw-keepers';
import { drawSheet, findSheet } from './find-sheet';

type Props = {
  readonly params: Promise<{ readonly code: string }>;
  readonly searchParams: Promise<Record<string, string | string[] | undefined>>;
};

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const sheet = await findSheet((await params).code);
  if (sheet === null) return {};
  const { name } = sheet;
  return { title: words('regions.sheet.titleOf', { name }), description: words('regions.sheet.description', { name }) };
}

export default async function RegionPage({ params, searchParams }: Props): Promise<ReactElement> {
  const { code } = await params;
  const query = await searchParams;
  const { on } = query;
  const asked = typeof on === 'string' ? on.trim() : '';
  const day = parseCalendarDate(asked);
  if (day !== null && regionCode.safeParse(code).success) redirect(`/regions/${code}/on/${day}`);
  const sheet = await findSheet(code);
  if (sheet === null && countryCodes.includes(code)) redirect(`/regions?q=${encodeURIComponent(placeWords(code))}`);
  if (sheet === null) notFound();
  const keeping = await drawKeepers(sheet, query);
  return drawSheet(sheet, asked === '' ? { keeping } : { keeping, badDay: asked.slice(0, 40) });
}
