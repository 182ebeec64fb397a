import { LARGEST_FILE } from '@/lib/files/domain/kept-file';
import { keepPageSeen, type KeptPage, type NotKeptPage } from '@/lib/files/keep-page-seen';
import { uploadFields } from '@/lib/files/schema';
import { err, type Result } from '@/lib/kernel/result';
import { makeActorCtx } from '@/lib/server/actor-ctx';
import { answering } from '@/lib/server/api';
import { lengthIn, takeUpload, type Fields, type SentFile, type UploadRefusal } from '@/lib/server/upload-form';
import { backTo, PRIVATE, refuse, wantsJson } from './file-answers';

/** Up to this, a body that is refused by its length is still passed over, so that the browser gets to read the answer. */
const PASSED_OVER = 4 * LARGEST_FILE;

/**
 * Takes the copy of a page that a source was read in: a form of ours with `key`, `back`, what else the page wants back (`source`), and
 * then `file`. A script that accepts JSON gets JSON; a browser is led back to the page, with `?file=` or `?refused=` in its address.
 */
export async function POST(request: Request): Promise<Response> {
  const response = await answering(async () => {
    const { result, fields, isRead } = await takeUpload(request, LARGEST_FILE, keep);
    if (result.ok) return kept(request, result.value, fields);
    const isLong = (lengthIn(request.headers) ?? Infinity) > PASSED_OVER;
    return refuse(result.error, { request, back: fields['back'], isUnread: !isRead && isLong });
  });
  response.headers.delete('access-control-allow-origin'); // this is nobody's but our own pages' to call
  return response;
}

async function keep({ name, body, declaredBytes }: SentFile, fields: Fields): Promise<Result<KeptPage, NotKeptPage | UploadRefusal>> {
  const given = uploadFields.safeParse(fields);
  if (!given.success) return err({ kind: 'malformed' });
  return keepPageSeen(await makeActorCtx(), { key: given.data.key, name, body, declaredBytes });
}

function kept(request: Request, { fileId, sha256, type, bytes }: KeptPage, fields: Fields): Response {
  if (wantsJson(request)) return Response.json({ file: { id: fileId, sha256, type, bytes } }, { status: 201, headers: PRIVATE });
  const { source, back = '/bench' } = fields;
  const location = backTo(back, { file: fileId, ...(source === undefined ? {} : { source }) });
  return new Response(null, { status: 303, headers: { ...PRIVATE, location } });
}
