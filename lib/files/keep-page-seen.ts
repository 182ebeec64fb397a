import 'server-only';
import { lockAccount } from '@/db/accounts';
import { countSentSince, deleteGoneFile, giveUpComingFile, insertComingFile, markFileReady } from '@/db/files';
import { inTransaction } from '@/db/transaction';
import type { SignedIn } from '@/lib/access/domain/actor';
import { mayNow, type AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import { readyToKeep, type NotKept, type ReadyFile } from '@/lib/server/file-store/ready-file';
import { newStoreKey, type Bytes, type FileStore } from '@/lib/server/file-store/file-store';
import { receive, type Incoming, type NotReceived } from '@/lib/server/file-store/incoming';
import { fileStore } from '@/lib/server/file-store/own-store';
import { storing, type StoreRefusal } from '@/lib/server/file-store/store-fault';
import { take, type TooMany } from '@/lib/server/limits';
import { newId } from '@/lib/server/new-id';
import { tidyFileName } from './domain/file-name';
import { isTooMuch, LARGEST_FILE, type FileId, type FileFingerprint, type KeptFile } from './domain/kept-file';
import { fileId } from './schema';

export type PageSeen = {
  /** Of the form: one a submission. */
  readonly key: string;
  readonly name: string;
  readonly body: Bytes;
  /** What the sender says it weighs; counted all the same. */
  readonly declaredBytes: number;
};

export type KeptPage = FileFingerprint & { readonly fileId: FileId };

export type NotKeptPage = AccessRefusal | TooMany | NotReceived | NotKept | StoreRefusal | ChangeRefusal | { readonly kind: 'quota' };
type Kept = Result<KeptPage, NotKeptPage>;

const DAY_MS = 86_400_000;

/**
 * Keeps a copy of a page that a source was read in: a PDF, a picture or plain text, told by its content. A PDF and a text are kept as
 * they came; a picture is drawn anew first, so that its fingerprint is of the file drawn by us, not of the one that was sent. The same
 * form sent twice keeps one file. Nothing is left of a file that is refused.
 */
export async function keepPageSeen(ctx: ActorCtx, input: PageSeen, store: FileStore = fileStore()): Promise<Kept> {
  const who = askKeeper(ctx);
  if (!who.ok) return who;
  const early = await refuseEarly(ctx, who.value, input);
  if (!early.ok) return early;
  const kept = await storing('files', () =>
    receive(input.body, LARGEST_FILE, (incoming) => keep(ctx, { input, incoming, owner: who.value, store })),
  );
  return kept.ok ? kept.value : kept;
}

function askKeeper(ctx: ActorCtx): Result<SignedIn, AccessRefusal> {
  const may = mayNow(ctx.actor, 'file.keep', ctx.now);
  if (!may.ok) return may;
  return ctx.actor.kind === 'account' ? ok(ctx.actor) : err({ kind: 'sign-in' });
}

/** What can be said before a byte is read. */
async function refuseEarly(ctx: ActorCtx, { id }: SignedIn, { declaredBytes }: PageSeen): Promise<Result<null, NotKeptPage>> {
  if (declaredBytes > LARGEST_FILE) return err({ kind: 'too-large' });
  const counted = await take('upload', id, ctx);
  if (!counted.ok) return counted;
  return isTooMuch(await countSentSince(ctx.db, id, dayBefore(ctx)), 0) ? err({ kind: 'quota' }) : ok(null);
}

const dayBefore = ({ now }: ActorCtx): Date => new Date(now.getTime() - DAY_MS);

type Work = { readonly input: PageSeen; readonly incoming: Incoming; readonly owner: SignedIn; readonly store: FileStore };

async function keep(ctx: ActorCtx, { input, incoming, owner, store }: Work): Promise<Kept> {
  const ready = await readyToKeep(incoming);
  if (!ready.ok) return ready;
  const file = rowOf(ctx, owner, input.name, ready.value);
  const begun = await begin(ctx, owner, file);
  if (!begun.ok) return begun;
  const put = await storing('files', () => store.put(file.storeKey, ready.value.stream(), file));
  if (!put.ok) {
    await giveUpComingFile(ctx.db, file.id); // the worker asks the store again; a person has waited for it long enough
    return put;
  }
  const kept = await finish(ctx, input.key, file);
  // Refused, or the same form was here before: this copy is not the one that stays.
  if (!kept.ok || kept.value.fileId !== file.id) await letGo(ctx, file, store);
  return kept;
}

type Coming = Omit<KeptFile, 'state'>;

const rowOf = ({ now }: ActorCtx, owner: SignedIn, name: string, { type, bytes, sha256 }: ReadyFile): Coming => ({
  id: fileId.parse(newId(now)),
  storeKey: newStoreKey(),
  sha256,
  type,
  bytes,
  name: tidyFileName(name),
  ownerId: owner.id,
  purpose: 'page-seen',
  madeAt: now,
});

/** The row goes in before the object, so that whatever breaks in between is found and cleared away. Counted under the account's lock. */
function begin(
  ctx: ActorCtx,
  { id }: SignedIn,
  file: Coming,
): Promise<Result<null, { readonly kind: 'quota' } | { readonly kind: 'sign-in' }>> {
  return inTransaction(ctx.db, async (trx): Promise<Result<null, { readonly kind: 'quota' } | { readonly kind: 'sign-in' }>> => {
    if ((await lockAccount(trx, id)) === null) return err({ kind: 'sign-in' });
    if (isTooMuch(await countSentSince(trx, id, dayBefore(ctx)), file.bytes)) return err({ kind: 'quota' });
    await insertComingFile(trx, file);
    return ok(null);
  });
}

function finish(ctx: ActorCtx, key: string, { id, sha256, type, bytes, ownerId }: Coming): Promise<Kept> {
  const request = { key, who: ownerId ?? '', act: 'files.keep-page-seen', input: { sha256, type, bytes } };
  return change<KeptPage, StoreRefusal>(ctx, request, async (trx) =>
    (await markFileReady(trx, id)) ? ok({ fileId: id, sha256, type, bytes }) : err({ kind: 'store-down' }),
  );
}

/** Takes a copy back at once. What cannot be removed now is removed by the worker. */
async function letGo(ctx: ActorCtx, { id, storeKey }: Coming, store: FileStore): Promise<void> {
  if (!(await giveUpComingFile(ctx.db, id))) return;
  const removed = await storing('files', () => store.remove(storeKey));
  if (removed.ok) await deleteGoneFile(ctx.db, id);
}
