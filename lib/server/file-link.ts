import 'server-only';
import { timingSafeEqual } from 'node:crypto';
import { LINK_MS } from '@/lib/files/domain/kept-file';
import { err, ok, type Result } from '@/lib/kernel/result';
import { keyedHash } from './seal';

const signatureOf = (id: string, until: number): string => keyedHash('file-link', `${id} ${until}`).toString('base64url');

/**
 * An address at which a file can be read without asking who reads: for a picture in a page whose reader may see the file. `until`: when
 * it ends; at most ten minutes ahead, or it is refused from the beginning.
 */
export function signedFileLink(id: string, until: Date): string {
  const seconds = Math.floor(until.getTime() / 1000);
  return `/api/files/${id}?until=${seconds}&sig=${signatureOf(id, seconds)}`;
}

type Link = { readonly id: string; readonly until: number; readonly sig: string };

/** Whether this site made the link and its time is not over. */
export function isLinkSigned(
  { id, until, sig }: Link,
  now: Date,
): Result<null, { readonly kind: 'link-over' } | { readonly kind: 'link-changed' }> {
  // As text, since several texts stand for the same bytes.
  const given = Buffer.from(sig);
  const right = Buffer.from(signatureOf(id, until));
  if (given.length !== right.length || !timingSafeEqual(given, right)) return err({ kind: 'link-changed' });
  const leftMs = until * 1000 - now.getTime();
  return leftMs > 0 && leftMs <= LINK_MS ? ok(null) : err({ kind: 'link-over' });
}
