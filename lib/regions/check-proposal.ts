import 'server-only';
import { listEditionsInUse } from '@/db/editions';
import { listMemberships, listRegions } from '@/db/regions';
import { documentFindings } from '@/lib/checks/domain/document-findings';
import type { Finding } from '@/lib/checks/domain/finding';
import { QUESTIONS } from '@/lib/checks/domain/questions';
import { checkSheet } from '@/lib/checks/domain/sheet-checks';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { endOf } from '@/lib/server/load-lines';
import { readEdition } from '@/lib/server/sheets';
import type { Sheet } from './domain/sheet';
import { sheetDocument } from './schema';

export type ProposalInput = {
  /** The place it is proposed for. */
  readonly code: string;
  /** The whole proposed document, as it came in. */
  readonly document: unknown;
  /** Number of the edition it is based on; null for a place without a sheet. */
  readonly base: number | null;
  /** The day it is to come into use. */
  readonly on: CalendarDate;
};

/** `sheet` is null while the document is no sheet: then the findings are those of its form alone. */
export type CheckedProposal = { readonly sheet: Sheet | null; readonly findings: readonly Finding[] };

/** Runs the ten checks over a proposed sheet, with the sheets above and below it as they are in use on that day. Changes nothing. */
export async function checkProposal(ctx: Ctx, input: ProposalInput): Promise<Result<CheckedProposal, { kind: 'no-such-edition' }>> {
  const base = input.base === null ? null : await readEdition(ctx.db, input.code, input.base);
  if (input.base !== null && base === null) return err({ kind: 'no-such-edition' });
  const parsed = sheetDocument.safeParse(input.document);
  if (!parsed.success) return ok({ sheet: null, findings: documentFindings(parsed.error.issues, input.document) });
  if (parsed.data.code !== input.code) {
    const issue = { path: ['code'], message: `This sheet is proposed for "${input.code}"` };
    return ok({ sheet: null, findings: documentFindings([issue], input.document) });
  }
  const [memberships, regions] = await Promise.all([listMemberships(ctx.db), listRegions(ctx.db)]);
  const codes = regions.filter(({ edition }) => edition !== null).map(({ code }) => code);
  const heads = await listEditionsInUse(ctx.db, codes, endOf(input.on));
  const editions = await Promise.all(heads.map(({ region, number }) => readEdition(ctx.db, region, number)));
  const sheets = new Map(editions.flatMap((edition) => (edition === null ? [] : [[edition.region, edition.sheet] as const])));
  const findings = checkSheet({
    proposed: parsed.data,
    base: base?.sheet ?? null,
    sheets,
    memberships,
    on: input.on,
    questions: QUESTIONS,
  });
  return ok({ sheet: parsed.data, findings });
}
