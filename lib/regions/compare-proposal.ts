import 'server-only';
import { fingerprint } from '@/db/fingerprint';
import type { Edition } from '@/db/rows/edition-row';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { canonicalJson } from '@/lib/kernel/canonical-json';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { readEdition } from '@/lib/server/sheets';
import { compareSheets, type Version } from './compare-sheets';
import type { ComparedEditions } from './domain/compared-editions';
import type { Sheet } from './domain/sheet';

export type ProposalToCompare = {
  readonly region: string;
  /** Number of the edition it is based on; null for a place without a sheet. */
  readonly base: number | null;
  readonly document: Sheet;
  readonly summary: string;
};

/** What a proposed sheet does, held against the edition it is based on; its number is the one it would come into use as. */
export async function compareProposal(
  ctx: Ctx,
  { region, base, document, summary }: ProposalToCompare,
): Promise<Result<ComparedEditions, { kind: 'no-such-edition' }>> {
  const before = base === null ? null : await readEdition(ctx.db, region, base);
  if (base !== null && before === null) return err({ kind: 'no-such-edition' });
  const after = {
    head: { number: (base ?? 0) + 1, summary, inUseFrom: ctx.now },
    sheet: document,
    hash: fingerprint(canonicalJson(document)),
  };
  const compared = await compareSheets(ctx, { before: versionOf(before), after, on: calendarDateOf(ctx.now) });
  const known = new Set(before?.sheet.rules.map(({ id }) => id));
  const proposed = new Set(document.rules.map(({ id }) => id).filter((id) => !known.has(id)));
  return ok({ ...compared, names: { ...compared.names, proposed } });
}

const versionOf = (edition: Edition | null): Version | null => {
  if (edition === null) return null;
  const { number, summary, inUseFrom, sheet, hash } = edition;
  return { head: { number, summary, inUseFrom }, sheet, hash };
};
