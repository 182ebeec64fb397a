import { cache, type ReactElement, type ReactNode } from 'react';
import { RegionSheetPage } from '@/components/regions/region-sheet';
import { calendarDateOf, type CalendarDate } from '@/lib/kernel/calendar-date';
import { splitText } from '@/lib/regions/domain/sheet-reading';
import { readRegionSheet, type RegionSheet } from '@/lib/regions/read-region-sheet';
import { regionCode } from '@/lib/regions/schema';
import { makeCtx } from '@/lib/server/ctx';
import { renderMarkdown } from '@/lib/server/markdown';

/** The sheet of that place on that day, today when none is given; null where there is none. Read once a request. */
export const findSheet = cache(async (code: string, on?: CalendarDate): Promise<RegionSheet | null> => {
  if (!regionCode.safeParse(code).success) return null;
  const found = await readRegionSheet(makeCtx(), { code, on });
  return found.ok ? found.value : null;
});

type Said = { readonly keeping?: ReactNode; readonly badDay?: string; readonly edition?: { readonly inUseTo: CalendarDate | null } };

/** The page of a sheet, its texts drawn from Markdown. */
export function drawSheet(sheet: RegionSheet, said: Said = {}): ReactElement {
  const { introduction, coming } = splitText(sheet.text);
  return (
    <RegionSheetPage
      sheet={sheet}
      today={calendarDateOf(new Date())}
      introduction={drawText(introduction)}
      coming={coming === null ? null : drawText(coming)}
      {...said}
    />
  );
}

/** Text that cannot be drawn still stands there to be read. */
function drawText(text: string): ReactNode {
  const drawn = renderMarkdown(text);
  return drawn.ok ? drawn.value : <p>{text}</p>;
}
