import 'server-only';
import { findRuleHome } from '@/db/rules';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { readEdition } from '@/lib/server/sheets';
import { tellRule, type ToldRule } from './domain/told-rule';

/** A rule as its newest edition has it. `withdrawn` when the sheet's edition in use no longer holds it. */
export type ReadRule = {
  readonly rule: ToldRule;
  readonly edition: number;
  readonly withdrawn: boolean;
  readonly sheet: { readonly code: string; readonly name: string };
  /** Rules of the same sheet that this one targets or that target it. */
  readonly attacks: readonly { readonly id: string; readonly kind: ToldRule['kind']; readonly title: string }[];
};

/** The rule of that id, wherever it stands. */
export async function readRule(ctx: Ctx, id: string): Promise<Result<ReadRule, { kind: 'not-found' }>> {
  const home = await findRuleHome(ctx.db, id);
  if (home === null) return err({ kind: 'not-found' });
  const edition = await readEdition(ctx.db, home.region, home.edition);
  const rule = edition?.sheet.rules.find((one) => one.id === id);
  if (edition === null || rule === undefined) throw new Error(`The rows of "${id}" and its edition disagree`);
  const { sheet } = edition;
  return ok({
    rule: tellRule(rule, sheet.sources),
    edition: home.edition,
    withdrawn: home.edition < home.inUse,
    sheet: { code: sheet.code, name: sheet.name },
    attacks: sheet.rules
      .filter(({ targets }) => targets.includes(id))
      .map(({ id: attacker, kind, title }) => ({ id: attacker, kind, title })),
  });
}
