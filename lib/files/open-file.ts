import 'server-only';
import { err, type Result } from '@/lib/kernel/result';
import type { FileStore } from '@/lib/server/file-store/file-store';
import { fileStore } from '@/lib/server/file-store/own-store';
import { storing, type StoreRefusal } from '@/lib/server/file-store/store-fault';
import type { KeptFile } from './domain/kept-file';

/** The bytes of a file that whoever asks may read. One whose object is missing is a fault of the store. */
export async function openFile(
  { storeKey }: KeptFile,
  store: FileStore = fileStore(),
): Promise<Result<ReadableStream<Uint8Array>, StoreRefusal>> {
  const opened = await storing('files', () => store.read(storeKey));
  if (!opened.ok) return opened;
  return opened.value === null ? err({ kind: 'store-down' }) : { ok: true, value: opened.value };
}
