import { keepEntryInput } from '@/lib/regions/amendment-schema';
import { keepEntry } from '@/lib/regions/keep-entry';
import { makeActorCtx } from '@/lib/server/actor-ctx';
import { answering, readBody } from '@/lib/server/api';
import { ownOrigin } from '@/lib/server/own-site';
import { problemResponse } from '@/lib/server/problem';

const PRIVATE = { 'cache-control': 'private, no-store' };

/**
 * Keeps what is being typed into a form of an amendment: `{id, item, version, values}`, from a page of ours. Answers with the version
 * it has now; with 409 and what stands there, when another tab was first.
 */
export async function POST(request: Request): Promise<Response> {
  const response = await answering(async () => {
    if (request.headers.get('origin') !== ownOrigin()) return new Response(null, { status: 403, headers: PRIVATE });
    const input = await readBody(request, keepEntryInput);
    if (!input.ok) return problemResponse(input.error);
    const kept = await keepEntry(await makeActorCtx(), input.value);
    if (kept.ok) return Response.json(kept.value, { headers: PRIVATE });
    const { error } = kept;
    if (error.kind === 'entry-moved-on')
      return Response.json({ version: error.version, values: error.values }, { status: 409, headers: PRIVATE });
    return new Response(null, { status: statusOf(error.kind), headers: PRIVATE });
  });
  response.headers.delete('access-control-allow-origin');
  return response;
}

/** What has to be done first is told alike: the page leads there when its form is sent. What is not one's own is not there. */
function statusOf(kind: string): number {
  if (kind === 'not-found' || kind === 'not-allowed') return 404;
  return kind === 'already-decided' || kind === 'own-amendment' ? 410 : 401;
}
