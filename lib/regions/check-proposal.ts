import 'server-only';
import { fingerprint } from '@/db/fingerprint';
import { listEditionsInUse, listNumbersInUse, type WorldEditions } from '@/db/editions';
import { listMemberships } from '@/db/regions';
import type { Edition, EditionHead } from '@/db/rows/edition-row';
import { inTransaction } from '@/db/transaction';
import { documentFindings } from '@/lib/checks/domain/document-findings';
import type { Finding } from '@/lib/checks/domain/finding';
import { QUESTIONS } from '@/lib/checks/domain/questions';
import { checkSheet } from '@/lib/checks/domain/sheet-checks';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { canonicalJson } from '@/lib/kernel/canonical-json';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { endOf } from '@/lib/server/load-lines';
import { readEdition } from '@/lib/server/sheets';
import type { Memberships } from './domain/line';
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

/**
 * `sheet` is null while the document is no sheet: then the findings are those of its form alone. `world`: the editions in use it was
 * checked with.
 */
export type CheckedProposal = { readonly sheet: Sheet | null; readonly findings: readonly Finding[]; readonly world: WorldEditions };

/** Runs the ten checks over a proposed sheet, with the sheets above and below it as they are in use on that day. Changes nothing. */
export async function checkProposal(ctx: Ctx, input: ProposalInput): Promise<Result<CheckedProposal, { kind: 'no-such-edition' }>> {
  const base = input.base === null ? null : await readEdition(ctx.db, input.code, input.base);
  if (input.base !== null && base === null) return err({ kind: 'no-such-edition' });
  const parsed = parseFor(input);
  if (!parsed.ok) return ok({ sheet: null, findings: parsed.error, world: new Map() });
  const around = await readWorld(ctx, input.on);
  const findings = await findingsOf(ctx, around, { proposed: parsed.value, base, on: input.on });
  return ok({ sheet: parsed.value, findings, world: around.world });
}

/** Findings are kept by all that goes into them: what a moderator has open is checked again when they approve it. */
const kept = new Map<string, readonly Finding[]>();
const CHECKED = 60;

function keepFound(key: string, findings: readonly Finding[]): void {
  kept.set(key, findings);
  const [oldest] = kept.keys();
  if (kept.size > CHECKED && oldest !== undefined) kept.delete(oldest);
}

type ToCheck = { readonly proposed: Sheet; readonly base: Edition | null; readonly on: CalendarDate };

async function findingsOf(ctx: Ctx, { memberships, heads }: ReadWorld, { proposed, base, on }: ToCheck): Promise<readonly Finding[]> {
  const document = fingerprint(canonicalJson(proposed));
  const key = JSON.stringify([document, base?.hash, on, heads.map(({ hash }) => hash), [...memberships]]);
  const known = kept.get(key);
  if (known !== undefined) return known;
  const editions = await Promise.all(heads.map(({ region, number }) => readEdition(ctx.db, region, number)));
  const sheets = new Map(editions.flatMap((edition) => (edition === null ? [] : [[edition.region, edition.sheet] as const])));
  const findings = checkSheet({ proposed, base: base?.sheet ?? null, sheets, memberships, on, questions: QUESTIONS });
  keepFound(key, findings);
  return findings;
}

function parseFor({ code, document }: ProposalInput): Result<Sheet, readonly Finding[]> {
  const parsed = sheetDocument.safeParse(document);
  if (!parsed.success) return err(documentFindings(parsed.error.issues, document));
  const issue = { path: ['code'], message: `This sheet is proposed for "${code}"` };
  return parsed.data.code === code ? ok(parsed.data) : err(documentFindings([issue], document));
}

type ReadWorld = { readonly memberships: Memberships; readonly heads: readonly EditionHead[]; readonly world: WorldEditions };

/** In one transaction, so that memberships and editions belong to one state. */
async function readWorld({ db }: Ctx, on: CalendarDate): Promise<ReadWorld> {
  const read = await inTransaction(db, async (trx): Promise<Result<ReadWorld, never>> => {
    const memberships = await listMemberships(trx);
    const world = await listNumbersInUse(trx);
    return ok({ memberships, heads: await listEditionsInUse(trx, [...world.keys()], endOf(on)), world });
  });
  return read.ok ? read.value : read.error;
}
