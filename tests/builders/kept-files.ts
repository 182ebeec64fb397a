import { randomBytes } from 'node:crypto';
import { insertComingFile, markFileReady } from '@/db/files';
import { db } from '@/db/connection';
import { inTransaction } from '@/db/transaction';
import type { AccountId } from '@/lib/access/domain/actor';
import type { KeptFile } from '@/lib/files/domain/kept-file';
import { fileId } from '@/lib/files/schema';
import { ok } from '@/lib/kernel/result';
import { newStoreKey } from '@/lib/server/file-store/file-store';
import { fileStore } from '@/lib/server/file-store/own-store';
import { newId } from '@/lib/server/new-id';
import { NOW } from './people';

/** Puts a file of one line into the store and its row into the table. */
export async function aKeptFile(ownerId: AccountId | null, over: Partial<KeptFile> = {}): Promise<KeptFile> {
  const text = Buffer.from('A page that was seen.');
  const file: KeptFile = {
    id: fileId.parse(newId(NOW)),
    storeKey: newStoreKey(),
    sha256: randomBytes(32).toString('hex'),
    type: 'text/plain',
    bytes: text.byteLength,
    name: 'page.txt',
    ownerId,
    purpose: 'page-seen',
    state: 'ready',
    madeAt: NOW,
    ...over,
  };
  await fileStore().put(file.storeKey, [text], file);
  await inTransaction(db, async (trx) => {
    await insertComingFile(trx, file);
    if (file.state === 'ready') await markFileReady(trx, file.id);
    return ok(null);
  });
  return file;
}
