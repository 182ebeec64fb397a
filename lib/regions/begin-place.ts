import 'server-only';
import { insertAmendment } from '@/db/amendments';
import { findNumberInUse } from '@/db/editions';
import { listMemberships } from '@/db/regions';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { newId } from '@/lib/server/new-id';
import { amendmentId, type NewPlaceInput } from './amendment-schema';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import type { AmendmentId } from './domain/amendment';
import type { Membership } from './domain/sheet';
import { emptySheet } from './domain/sheet-items';

/** `has-sheet`: an amendment to it is begun instead. */
export type BeginPlaceRefusal = AccessRefusal | ChangeRefusal | { readonly kind: 'has-sheet' };

/** Begins a draft of the first sheet of a place: with the layers it is known to be part of, and the one that is named. */
export async function beginPlace(ctx: ActorCtx, input: NewPlaceInput): Promise<Result<{ id: AmendmentId }, BeginPlaceRefusal>> {
  const own = askSignedIn(ctx, 'amendment.write');
  if (!own.ok) return own;
  const { key, region, name, kind, languages, parent, text } = input;
  const known = (await listMemberships(ctx.db)).get(region) ?? [];
  const document = { ...emptySheet(region, name, kind), languages, text, memberships: withParent(known, parent) };
  const asked = { key, who: own.value.id, act: 'regions.begin-place', input: { region, name, kind, languages, parent, text } };
  return change(ctx, asked, async (trx): Promise<Result<{ id: AmendmentId }, BeginPlaceRefusal>> => {
    if ((await findNumberInUse(trx, region)) !== null) return err({ kind: 'has-sheet' });
    const id = amendmentId.parse(newId(ctx.now));
    await insertAmendment(trx, { id, region, authorId: own.value.id, baseNumber: null, document, at: ctx.now });
    return ok({ id });
  });
}

const withParent = (known: readonly Membership[], parent: string | null): readonly Membership[] =>
  parent === null || known.some((edge) => edge.parent === parent) ? known : [...known, { parent, from: null, to: null, except: [] }];
