import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { parseCalendarDate } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import type { RegionSheet } from '@/lib/regions/read-region-sheet';
import { drawSheet, findSheet } from '../../find-sheet';

type Props = { readonly params: Promise<{ readonly code: string; readonly date: string }> };

async function findOn({ params }: Props): Promise<RegionSheet | null> {
  const { code, date } = await params;
  const on = parseCalendarDate(date);
  return on === null ? null : findSheet(code, on);
}

export async function generateMetadata(props: Props): Promise<Metadata> {
  const sheet = await findOn(props);
  if (sheet === null) return {};
  const { name, on } = sheet;
  return {
    title: words('regions.sheet.titleOn', { name, date: sayDate(on) }),
    description: words('regions.sheet.description', { name }),
    // One page in as many copies as there are days: search sites keep the one of today.
    robots: { index: false },
  };
}

export default async function RegionOnDayPage(props: Props): Promise<ReactElement> {
  const sheet = await findOn(props);
  if (sheet === null) notFound();
  return drawSheet(sheet);
}
