import 'server-only';
import { findFile, isCitedInUse } from '@/db/files';
import { mayNow, type AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import type { Ctx } from '@/lib/server/ctx';
import { isLinkSigned } from '@/lib/server/file-link';
import { mayReadFile, type FileId, type KeptFile } from './domain/kept-file';
import type { LinkQuery } from './schema';

export type NoFile = { readonly kind: 'not-found' };
export type NoLink = { readonly kind: 'link-over' } | { readonly kind: 'link-changed' };

/** A kept file, for those who may read it; for others it is not there. */
export async function readFile(ctx: ActorCtx, id: FileId): Promise<Result<KeptFile, AccessRefusal | NoFile>> {
  const may = mayNow(ctx.actor, 'file.read', ctx.now);
  if (!may.ok) return may;
  const { actor } = ctx;
  if (actor.kind !== 'account') return err({ kind: 'sign-in' });
  const file = await findFile(ctx.db, id);
  if (file === null) return err({ kind: 'not-found' });
  const mayThis = mayReadFile(actor, file, false) || mayReadFile(actor, file, await isCitedInUse(ctx.db, file.sha256));
  return mayThis ? ok(file) : err({ kind: 'not-found' });
}

/** The file of a signed link, for whoever holds it: a page that may show the file made the link, for some minutes. */
export async function readLinkedFile(ctx: Ctx, id: FileId, { until, sig }: LinkQuery): Promise<Result<KeptFile, NoFile | NoLink>> {
  const signed = isLinkSigned({ id, until, sig }, ctx.now);
  if (!signed.ok) return signed;
  const file = await findFile(ctx.db, id);
  return file === null ? err({ kind: 'not-found' }) : ok(file);
}
