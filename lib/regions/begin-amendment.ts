import 'server-only';
import { findNumberInUse } from '@/db/editions';
import { insertAmendment } from '@/db/amendments';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { newId } from '@/lib/server/new-id';
import { readEdition } from '@/lib/server/sheets';
import { amendmentId, type BeginInput } from './amendment-schema';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import type { AmendmentId } from './domain/amendment';

/** `no-sheet`: a place without one is begun by `beginPlace`, which asks what it is. */
export type BeginRefusal = AccessRefusal | ChangeRefusal | { readonly kind: 'no-sheet' };

/** Begins a draft with the sheet as it stands in the edition in use. The same key twice is one draft. */
export async function beginAmendment(ctx: ActorCtx, { key, region }: BeginInput): Promise<Result<{ id: AmendmentId }, BeginRefusal>> {
  const own = askSignedIn(ctx, 'amendment.write');
  if (!own.ok) return own;
  const number = await findNumberInUse(ctx.db, region);
  const base = number === null ? null : await readEdition(ctx.db, region, number);
  const asked = { key, who: own.value.id, act: 'regions.begin-amendment', input: { region } };
  return change(ctx, asked, async (trx): Promise<Result<{ id: AmendmentId }, BeginRefusal>> => {
    if (base === null) return err({ kind: 'no-sheet' });
    const id = amendmentId.parse(newId(ctx.now));
    const draft = { id, region, authorId: own.value.id, baseNumber: base.number, document: base.sheet, at: ctx.now };
    await insertAmendment(trx, draft);
    return ok({ id });
  });
}
