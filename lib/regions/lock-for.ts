import 'server-only';
import { listDecisions } from '@/db/amendment-decisions';
import { lockAmendment, type StoredAmendment } from '@/db/amendments';
import type { Trx } from '@/db/transaction';
import type { AccountId } from '@/lib/access/domain/actor';
import { err, ok, type Result } from '@/lib/kernel/result';
import { judgeAct, type AmendmentAct, type AmendmentId, type AmendmentRefusal, type AmendmentState } from './domain/amendment';
import { namePeople } from './name-people';

/** As the domain refuses, and who was first where something was decided already; null where its author did it. */
export type ActRefusal =
  | Exclude<AmendmentRefusal, { kind: 'already-decided' }>
  | { readonly kind: 'already-decided'; readonly state: AmendmentState; readonly by: string | null };

export type LockedAmendment = StoredAmendment & { readonly next: AmendmentState };
export type ActOn = { readonly id: AmendmentId; readonly who: AccountId; readonly act: AmendmentAct };

/** Holds the amendment for the rest of the transaction and judges whether this person may do that to it as it stands. */
export async function lockFor(trx: Trx, { id, who, act }: ActOn): Promise<Result<LockedAmendment, ActRefusal>> {
  const stored = await lockAmendment(trx, id);
  if (stored === null) return err({ kind: 'not-found' });
  const judged = judgeAct(stored.amendment, who, act);
  if (!judged.ok) return err(await withWinner(trx, id, judged.error));
  return ok({ ...stored, next: judged.value });
}

/** Names whoever decided last, where that is why it cannot be done. */
export async function withWinner(trx: Trx, id: AmendmentId, refusal: AmendmentRefusal): Promise<ActRefusal> {
  if (refusal.kind !== 'already-decided') return refusal;
  const last = (await listDecisions(trx, id)).at(-1) ?? null;
  if (last === null || !DECIDED.includes(refusal.state)) return { ...refusal, by: null };
  return { ...refusal, by: (await namePeople(trx, [last.by]))(last.by) };
}

const DECIDED: readonly AmendmentState[] = ['held', 'sent-back', 'once-approved', 'in-use', 'refused-stale'];
