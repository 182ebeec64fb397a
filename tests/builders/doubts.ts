import { randomBytes } from 'node:crypto';
import { db } from '@/db/connection';
import { insertDoubt, moveDoubt } from '@/db/doubts';
import { findNumberInUse, publishEdition } from '@/db/editions';
import { insertKeeper } from '@/db/keepers';
import { putRegion } from '@/db/regions';
import { inTransaction } from '@/db/transaction';
import type { AccountId } from '@/lib/access/domain/actor';
import { ok } from '@/lib/kernel/result';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { newId } from '@/lib/server/new-id';
import { NOW } from './people';
import { aSheet } from './small-world';

const PLACE = 'xd';

/** The code of an invented place with a sheet of one rule, `xd-name`; put in at the first call. */
export async function aDoubtedPlace(): Promise<string> {
  if ((await findNumberInUse(db, PLACE)) === null) await putSheet(aSheet(PLACE));
  return PLACE;
}

/** Puts a sheet in use by itself, without layers above it. */
export async function putSheet(sheet: Sheet): Promise<void> {
  await inTransaction(db, async (trx) => {
    await putRegion(trx, { code: sheet.code, name: sheet.name, kind: sheet.kind });
    await publishEdition(trx, 1, { sheet, origin: 'seed', summary: 'Founding sheet', at: new Date('2026-01-01T00:00:00Z') });
    return ok(null);
  });
}

/** Puts a doubt that waits about that place's rule. Answers with its id. */
export async function aDoubt(words = 'The order was replaced last spring.', at = NOW): Promise<string> {
  const id = newId(at);
  const region = await aDoubtedPlace();
  await insertDoubt(db, { id, region, rule: `${PLACE}-name`, words, elsewhere: null, link: null, trace: randomBytes(32), at });
  return id;
}

/** Makes an account a keeper of that place's sheet. Answers with its code. */
export async function aKept(accountId: AccountId): Promise<string> {
  const region = await aDoubtedPlace();
  await inTransaction(db, async (trx) => {
    await insertKeeper(trx, { region, accountId, at: NOW });
    return ok(null);
  });
  return region;
}

/** A doubt that an account put aside. Answers with its id. */
export async function aSetAside(by: AccountId): Promise<string> {
  const id = await aDoubt();
  await inTransaction(db, async (trx) => {
    await moveDoubt(trx, id, 'waiting', { state: 'set-aside', why: 'Advertising', by, at: NOW });
    return ok(null);
  });
  return id;
}
