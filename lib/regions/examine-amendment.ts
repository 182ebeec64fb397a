import 'server-only';
import type { StoredAmendment } from '@/db/amendments';
import type { WorldEditions } from '@/db/editions';
import type { Finding } from '@/lib/checks/domain/finding';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import type { Ctx } from '@/lib/server/ctx';
import { checkProposal } from './check-proposal';
import { compareProposal } from './compare-proposal';
import type { CheckedAmendment } from './domain/amendment-view';

/** What the checks found in a version of an amendment, with the sheets around it in these editions. */
export type Examined = { readonly version: number; readonly world: WorldEditions; readonly findings: readonly Finding[] };

/** Runs the checks on an amendment as it stands. Throws where its base is gone: no edition ever goes. */
export async function examineAmendment(ctx: Ctx, { amendment, document }: StoredAmendment): Promise<Examined> {
  const { region, baseNumber, version } = amendment;
  const checked = await checkProposal(ctx, { code: region, document, base: baseNumber, on: calendarDateOf(ctx.now) });
  if (!checked.ok) throw new Error(`The base of an amendment to "${region}" is missing`);
  return { version, world: checked.value.world, findings: checked.value.findings };
}

/** The same, with what it does. */
export async function examineFully(ctx: Ctx, stored: StoredAmendment): Promise<Examined & CheckedAmendment> {
  const examined = await examineAmendment(ctx, stored);
  const { region, baseNumber, summary } = stored.amendment;
  const compared = await compareProposal(ctx, { region, base: baseNumber, document: stored.document, summary });
  if (!compared.ok) throw new Error(`The base of an amendment to "${region}" is missing`);
  return { ...examined, comparison: compared.value };
}

export const errorsIn = (findings: readonly Finding[]): readonly Finding[] => findings.filter(({ level }) => level === 'error');

/** Nothing came into use in between. */
export const isSameWorld = (a: WorldEditions, b: WorldEditions): boolean =>
  a.size === b.size && [...a].every(([region, number]) => b.get(region) === number);
