import 'server-only';
import { LOCALE } from '@/lib/kernel/words';
import type { Ctx } from '@/lib/server/ctx';
import { citedTexts, searchTexts, type CitedText } from './domain/cited-text';
import { listSheetsInUse } from './list-sheets-in-use';

export type SourcesQuery = {
  /** A reader's words; empty finds all. */
  readonly asked: string;
  /** Only texts this sheet names. */
  readonly region: string | null;
  /** Only texts this rule rests on. */
  readonly rule: string | null;
  readonly page: number;
};

export type ListedSources = {
  readonly texts: readonly CitedText[];
  readonly count: number;
  readonly page: number;
  readonly pages: number;
  readonly places: readonly { readonly code: string; readonly name: string }[];
  readonly narrowed: { readonly code: string; readonly name: string } | null;
};

/** Texts on a page. */
const PAGE = 50;
const BY_TITLE = new Intl.Collator(LOCALE, { sensitivity: 'base', numeric: true });

/** Texts that the sheets in use cite, a page at a time. An unknown place or rule narrows nothing. */
export async function listSources(ctx: Ctx, { asked, region, rule, page }: SourcesQuery): Promise<ListedSources> {
  const sheets = (await listSheetsInUse(ctx)).map(({ sheet }) => sheet);
  const places = sheets.map(({ code, name }) => ({ code, name }));
  const narrowed = places.find(({ code }) => code === region) ?? null;
  const found = searchTexts(citedTexts(sheets, BY_TITLE), asked).filter(
    (text) =>
      (narrowed === null || text.places.some(({ code }) => code === narrowed.code)) &&
      (rule === null || text.resting.some(({ kind, id }) => kind === 'rule' && id === rule)),
  );
  const pages = Math.max(1, Math.ceil(found.length / PAGE));
  const shown = Math.min(Math.max(1, page), pages);
  return { texts: found.slice((shown - 1) * PAGE, shown * PAGE), count: found.length, page: shown, pages, places, narrowed };
}
