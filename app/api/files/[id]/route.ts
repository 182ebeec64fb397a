import { dispositionOf, servedName } from '@/lib/files/domain/file-name';
import type { FileRefusalKind } from '@/lib/files/domain/file-refusal';
import { isImage, type FileId, type KeptFile } from '@/lib/files/domain/kept-file';
import { openFile } from '@/lib/files/open-file';
import { readFile, readLinkedFile } from '@/lib/files/read-file';
import { fileId, linkQuery } from '@/lib/files/schema';
import { err, type Result } from '@/lib/kernel/result';
import { makeActorCtx } from '@/lib/server/actor-ctx';
import { answering } from '@/lib/server/api';
import { makeCtx } from '@/lib/server/ctx';
import { doorOf } from '@/lib/server/lead-on';
import { PRIVATE, saidInWords } from '../file-answers';

type Context = { readonly params: Promise<{ readonly id: string }> };

/**
 * A kept file, as something to be saved and never as a page. Who may read it is asked of the session; a signed link asks nobody, and
 * shows a picture in its place. Whoever may not read it is told what is said of a file that is not there.
 */
export async function GET(request: Request, { params }: Context): Promise<Response> {
  const response = await answering(async () => {
    const id = fileId.safeParse((await params).id);
    if (!id.success) return saidInWords('not-found');
    const query = Object.fromEntries(new URL(request.url).searchParams);
    const isLink = 'sig' in query || 'until' in query;
    const found = isLink ? await linked(id.data, query) : await readFile(await makeActorCtx(), id.data);
    return found.ok ? serve(request, found.value, isLink) : refused(found.error.kind, id.data);
  });
  response.headers.delete('access-control-allow-origin');
  return response;
}

async function linked(id: FileId, query: unknown): Promise<Result<KeptFile, { readonly kind: FileRefusalKind }>> {
  const link = linkQuery.safeParse(query);
  return link.success ? readLinkedFile(makeCtx(), id, link.data) : err({ kind: 'link-changed' });
}

/** Somebody who has only to finish signing in is led there; for all others the file is not there. */
function refused(kind: FileRefusalKind, id: FileId): Response {
  if (kind === 'second-factor-needed' || kind === 'sign-in-again' || kind === 'confirm-first') {
    return new Response(null, { status: 303, headers: { ...PRIVATE, location: doorOf(kind, `/api/files/${id}`) ?? '/' } });
  }
  return saidInWords(kind === 'sign-in' || kind === 'not-allowed' ? 'not-found' : kind);
}

async function serve(request: Request, file: KeptFile, isLink: boolean): Promise<Response> {
  const opened = await openFile(file);
  if (!opened.ok) return saidInWords(opened.error.kind);
  const { type, bytes, name } = file;
  const headers = {
    ...PRIVATE,
    'content-type': type === 'text/plain' ? 'text/plain; charset=utf-8' : type,
    'content-length': String(bytes),
    'content-disposition': dispositionOf(isLink && isImage(type) ? 'inline' : 'attachment', servedName(name, type)),
    'content-security-policy': "sandbox; default-src 'none'",
    'cross-origin-resource-policy': 'same-origin',
  };
  if (request.method !== 'HEAD') return new Response(opened.value, { headers });
  await opened.value.cancel();
  return new Response(null, { headers });
}
