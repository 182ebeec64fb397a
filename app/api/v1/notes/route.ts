import { listNotesInUse } from '@/lib/search/list-notes-in-use';
import { markOf, notesParameters } from '@/lib/search/schema';
import { counted, jsonResponse, preflight, readValue } from '@/lib/server/api';
import { makeCtx } from '@/lib/server/ctx';
import { problemResponse } from '@/lib/server/problem';

/** Studio notes in use, a page at a time; `after` leads on. */
export async function GET(request: Request): Promise<Response> {
  return counted(request, async () => {
    const url = new URL(request.url);
    const asked = readValue(Object.fromEntries(url.searchParams), notesParameters);
    if (!asked.ok) return problemResponse(asked.error);
    const { notes, next } = await listNotesInUse(makeCtx(), asked.value);
    const after = next === null ? null : markOf(next);
    const response = jsonResponse(request, { notes, after });
    if (after === null) return response;
    url.searchParams.set('after', after);
    response.headers.set('link', `<${url.pathname}${url.search}>; rel="next"`);
    return response;
  });
}

export const OPTIONS = (): Response => preflight('GET');
