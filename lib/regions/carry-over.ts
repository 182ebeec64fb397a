import 'server-only';
import { updateAmendment } from '@/db/amendments';
import { findEdition, findNumberInUse } from '@/db/editions';
import type { Trx } from '@/db/transaction';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import type { CarryOverInput } from './amendment-schema';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import type { Amendment } from './domain/amendment';
import type { Collision } from './domain/amendment-view';
import { faultsAt, type Faults } from './domain/fitted-item';
import { mergeSheets, type SheetsToMerge } from './domain/merge-sheets';
import type { Sheet } from './domain/sheet';
import { lockFor, type ActRefusal } from './lock-for';
import { sheetDocument } from './schema';

export type CarryOverRefusal =
  | AccessRefusal
  | ChangeRefusal
  | ActRefusal
  /** The edition it is based on is in use. */
  | { readonly kind: 'not-stale' }
  /** Both sides changed the same: whose is to stand has to be chosen. */
  | { readonly kind: 'collisions'; readonly collisions: readonly Collision[] }
  /** What came of it is no sheet: one side took away what the other rests on. */
  | { readonly kind: 'does-not-fit'; readonly faults: Faults };

/** Carries an amendment over to the edition in use: a draft with the changes of both. REG-55 */
export async function carryOver(ctx: ActorCtx, { key, id, choices }: CarryOverInput): Promise<Result<{ base: number }, CarryOverRefusal>> {
  const own = askSignedIn(ctx, 'amendment.write');
  if (!own.ok) return own;
  const asked = { key, who: own.value.id, act: 'regions.carry-over', input: { id, choices } };
  return change(ctx, asked, async (trx): Promise<Result<{ base: number }, CarryOverRefusal>> => {
    const locked = await lockFor(trx, { id, who: own.value.id, act: 'carry-over' });
    if (!locked.ok) return locked;
    const { amendment, document, next } = locked.value;
    const sides = await readSides(trx, amendment, document);
    if (sides === null) return err({ kind: 'not-stale' });
    const { merged, collisions } = mergeSheets(sides.sheets, choices);
    const open = collisions.filter((collision) => choices[collision.key] === undefined);
    if (open.length > 0) return err({ kind: 'collisions', collisions: open });
    const parsed = sheetDocument.safeParse(merged);
    if (!parsed.success) return err({ kind: 'does-not-fit', faults: faultsAt({ sheet: merged, key: 'place' }, parsed.error.issues) });
    const patch = { state: next, document: parsed.data, baseNumber: sides.number, at: ctx.now };
    await updateAmendment(trx, id, amendment.version, patch);
    return ok({ base: sides.number });
  });
}

type Sides = { readonly number: number; readonly sheets: SheetsToMerge };

/** Null while nothing came into use since. */
async function readSides(trx: Trx, { region, baseNumber }: Amendment, mine: Sheet): Promise<Sides | null> {
  const number = await findNumberInUse(trx, region);
  if (number === null || number === baseNumber) return null;
  const now = await findEdition(trx, region, number);
  if (now === null) return null;
  const base = baseNumber === null ? null : await findEdition(trx, region, baseNumber);
  return { number, sheets: { base: base?.sheet ?? null, now: now.sheet, mine } };
}
