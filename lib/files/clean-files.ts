import 'server-only';
import { deleteGoneFile, giveUpComingFiles, giveUpOwnerlessFile, isCitedAnywhere, listGoneFiles, listOwnerlessFiles } from '@/db/files';
import type { Ctx } from '@/lib/server/ctx';
import type { FileStore } from '@/lib/server/file-store/file-store';
import { fileStore } from '@/lib/server/file-store/own-store';
import { storing } from '@/lib/server/file-store/store-fault';

const AT_ONCE = 100;
const HOUR_MS = 3_600_000;

/**
 * Removes what no row stands for any more: files whose sending was never finished, and those of forgotten people that nothing cites.
 * The object goes before its row, so that a store that is down leaves work for the next round and nothing behind. Answers with how
 * many files went.
 */
export async function cleanFiles({ db, now }: Ctx, store: FileStore = fileStore()): Promise<number> {
  await giveUpComingFiles(db, new Date(now.getTime() - HOUR_MS));
  await giveUpUncited(db);
  let removed = 0;
  for (;;) {
    const gone = await listGoneFiles(db, AT_ONCE);
    for (const { id, storeKey } of gone) {
      if (!(await storing('clean-files', () => store.remove(storeKey))).ok) return removed;
      await deleteGoneFile(db, id);
      removed += 1;
    }
    if (gone.length < AT_ONCE) return removed;
  }
}

async function giveUpUncited(db: Ctx['db']): Promise<void> {
  let after = '';
  for (;;) {
    const some = await listOwnerlessFiles(db, after, AT_ONCE);
    for (const { id, sha256 } of some) if (!(await isCitedAnywhere(db, sha256))) await giveUpOwnerlessFile(db, id);
    const last = some.at(-1);
    if (last === undefined || some.length < AT_ONCE) return;
    after = last.id;
  }
}
