import 'server-only';
import { findTermHome } from '@/db/terms';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { readEdition } from '@/lib/server/sheets';
import { usesOfTerm, type TermUses } from './domain/term-uses';
import { tellSources } from './domain/told-rule';
import type { ToldTerm } from './domain/told-sheet';
import { listSheetsInUse } from './list-sheets-in-use';

/** A term as its newest edition has it. `withdrawn` when the sheet's edition in use no longer holds it. */
export type ReadTerm = {
  readonly term: ToldTerm;
  readonly edition: number;
  readonly withdrawn: boolean;
  readonly sheet: { readonly code: string; readonly name: string };
  readonly uses: TermUses;
};

/** The term of that id, wherever it stands, with what uses it in the sheets in use. */
export async function readTerm(ctx: Ctx, id: string): Promise<Result<ReadTerm, { kind: 'not-found' }>> {
  const home = await findTermHome(ctx.db, id);
  if (home === null) return err({ kind: 'not-found' });
  const [edition, inUse] = await Promise.all([readEdition(ctx.db, home.region, home.edition), listSheetsInUse(ctx)]);
  const term = edition?.sheet.terms.find((one) => one.id === id);
  if (edition === null || term === undefined) throw new Error(`The rows of "${id}" and its edition disagree`);
  const { code, name, sources } = edition.sheet;
  return ok({
    term: { ...term, sources: tellSources(term.sources, sources) },
    edition: home.edition,
    withdrawn: home.edition < home.inUse,
    sheet: { code, name },
    uses: usesOfTerm(
      inUse.map(({ sheet }) => sheet),
      id,
    ),
  });
}
