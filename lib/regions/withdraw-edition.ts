import 'server-only';
import { writeDayBook } from '@/db/day-book';
import { findNumberInUse, lockWorld } from '@/db/editions';
import { insertWithdrawal, listWithdrawals } from '@/db/edition-withdrawals';
import type { Edition } from '@/db/rows/edition-row';
import type { AccountId } from '@/lib/access/domain/actor';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import type { Finding } from '@/lib/checks/domain/finding';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { readEdition } from '@/lib/server/sheets';
import { SUMMARY_MOST, type WithdrawEditionInput } from './amendment-schema';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { checkProposal } from './check-proposal';
import { errorsIn, isSameWorld, type Examined } from './examine-amendment';
import { putInUse } from './put-in-use';

export type WithdrawRefusal =
  | AccessRefusal
  | ChangeRefusal
  | { readonly kind: 'not-found' }
  /** Another edition is in use. */
  | { readonly kind: 'not-in-use'; readonly inUse: number }
  /** There is none before it, or what would come back is the same. */
  | { readonly kind: 'nothing-before' }
  /** What would come back does not pass the checks beside the other sheets as they are today. */
  | { readonly kind: 'findings'; readonly errors: readonly Finding[] };

const TRIES = 3;

/** Takes the edition in use out of it: the one before comes back, as a new edition. REG-58 */
export async function withdrawEdition(ctx: ActorCtx, input: WithdrawEditionInput): Promise<Result<{ edition: number }, WithdrawRefusal>> {
  const own = askSignedIn(ctx, 'edition.withdraw');
  if (!own.ok) return own;
  for (let tries = 0; tries < TRIES; tries += 1) {
    const seen = await look(ctx, input);
    const withdrawn = await withdraw(ctx, own.value.id, { input, seen });
    if (withdrawn.ok) return withdrawn;
    const { error } = withdrawn;
    if (error.kind !== 'look-again') return err(error);
  }
  return err({ kind: 'busy' });
}

type Seen = Omit<Examined, 'version'> & { readonly last: Edition; readonly before: Edition };
type Again = { readonly kind: 'look-again' };
type Withdrawing = { readonly input: WithdrawEditionInput; readonly seen: Seen | null };

/** The edition and the last one before it that was not withdrawn, checked; null where there is nothing to bring back. */
async function look(ctx: ActorCtx, { region, number }: WithdrawEditionInput): Promise<Seen | null> {
  if ((await findNumberInUse(ctx.db, region)) !== number) return null;
  const withdrawn = new Set((await listWithdrawals(ctx.db, region)).map((one) => one.number));
  const earlier = Array.from({ length: number - 1 }, (_, index) => number - 1 - index).find((one) => !withdrawn.has(one));
  const last = await readEdition(ctx.db, region, number);
  const before = earlier === undefined ? null : await readEdition(ctx.db, region, earlier);
  if (last === null || before === null || before.hash === last.hash) return null;
  const proposal = { code: region, document: before.sheet, base: number, on: calendarDateOf(ctx.now) };
  const checked = await checkProposal(ctx, proposal);
  return checked.ok ? { last, before, world: checked.value.world, findings: checked.value.findings } : null;
}

async function withdraw(
  ctx: ActorCtx,
  who: AccountId,
  { input, seen }: Withdrawing,
): Promise<Result<{ edition: number }, WithdrawRefusal | Again>> {
  const { key, region, number, reason } = input;
  const asked = { key, who, act: 'regions.withdraw-edition', input: { region, number, reason } };
  return change(ctx, asked, async (trx): Promise<Result<{ edition: number }, WithdrawRefusal | Again>> => {
    const world = await lockWorld(trx);
    const inUse = world.get(region);
    if (inUse === undefined) return err({ kind: 'not-found' });
    if (inUse !== number) return err({ kind: 'not-in-use', inUse });
    if (seen === null) return err({ kind: 'nothing-before' });
    if (!isSameWorld(seen.world, world)) return err({ kind: 'look-again' });
    // A passage is asked of what is claimed anew. What comes back was in use already, with the passages it then had.
    const errors = errorsIn(seen.findings).filter(({ kind }) => kind !== 'no-passage-changed');
    if (errors.length > 0) return err({ kind: 'findings', errors });
    const edition = number + 1;
    const summary = `Edition ${String(number)} withdrawn: ${reason}`.slice(0, SUMMARY_MOST);
    const { before, last } = seen;
    await putInUse(trx, { number: edition, before: last.sheet, sheet: before.sheet, origin: 'withdrawal', summary, at: ctx.now });
    await insertWithdrawal(trx, { region, number, broughtBackAs: edition, reason, by: who, at: ctx.now });
    await writeDayBook(trx, {
      actorId: who,
      did: 'edition.withdraw',
      subject: { kind: 'edition', id: `${region}/${String(number)}` },
      reason,
      details: { region, edition: number, broughtBackAs: edition },
      at: ctx.now,
    });
    return ok({ edition });
  });
}
