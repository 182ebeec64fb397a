import 'server-only';
import { mayNow, type AccessRefusal } from '@/lib/access/domain/policy';
import { calendarDateOf, type CalendarDate } from '@/lib/kernel/calendar-date';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import type { LookAgainQuery } from './doubt-schema';
import { dueRules, type DueRule } from './domain/look-again-list';
import { listKeepers, type Keeper } from './list-keepers';
import { listSheetsInUse } from './list-sheets-in-use';

export type LookAgainList = {
  readonly today: CalendarDate;
  readonly days: number;
  readonly rules: readonly DueRule[];
  /** How many there are on all pages, and how many of them are past their day. */
  readonly count: number;
  readonly overdue: number;
  readonly page: number;
  readonly pages: number;
  readonly places: readonly { readonly code: string; readonly name: string }[];
  readonly keepers: readonly Keeper[];
  /** Sheets that whoever asks keeps, by code. */
  readonly own: readonly string[];
};

const WITHIN_DAYS = 60;
const AT_A_TIME = 100;

/** Rules over all sheets in use that are to be read afresh soon or should have been, the longest overdue first. */
export async function listLookAgain(ctx: ActorCtx, query: LookAgainQuery): Promise<Result<LookAgainList, AccessRefusal>> {
  const may = mayNow(ctx.actor, 'sheet.keep', ctx.now);
  if (!may.ok) return may;
  if (ctx.actor.kind !== 'account') return err({ kind: 'sign-in' });
  const me = ctx.actor.id;
  const { region, keeper, days = WITHIN_DAYS, page = 1 } = query;
  const [editions, keepers] = await Promise.all([listSheetsInUse(ctx), listKeepers(ctx)]);
  const today = calendarDateOf(ctx.now);
  const sheets = editions.map(({ sheet }) => sheet);
  const isKept = keptBy(keepers, keeper === 'me' ? me : keeper);
  const due = dueRules(
    sheets.filter(({ code }) => (region === undefined || code === region) && isKept(code)),
    today,
    days,
  );
  const pages = Math.max(1, Math.ceil(due.length / AT_A_TIME));
  const shown = Math.min(page, pages);
  return ok({
    today,
    days,
    rules: due.slice((shown - 1) * AT_A_TIME, shown * AT_A_TIME),
    count: due.length,
    overdue: due.filter(({ daysLeft }) => daysLeft < 0).length,
    page: shown,
    pages,
    places: sheets.map(({ code, name }) => ({ code, name })),
    keepers,
    own: keepers.filter(({ accountId }) => accountId === me).map(({ region: code }) => code),
  });
}

/** Which sheets are kept by that account, or by nobody; all of them where nothing was asked. */
function keptBy(keepers: readonly Keeper[], keeper: string | undefined): (code: string) => boolean {
  if (keeper === undefined) return () => true;
  if (keeper === 'nobody') {
    const kept = new Set(keepers.map(({ region }) => region));
    return (code) => !kept.has(code);
  }
  const own = new Set(keepers.filter(({ accountId }) => accountId === keeper).map(({ region }) => region));
  return (code) => own.has(code);
}
