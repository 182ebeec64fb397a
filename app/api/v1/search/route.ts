import { searchPages } from '@/lib/search/search-pages';
import { markOf, searchParameters } from '@/lib/search/schema';
import { counted, jsonResponse, preflight, readValue } from '@/lib/server/api';
import { makeCtx } from '@/lib/server/ctx';
import { problemResponse } from '@/lib/server/problem';

/** Notes, words, sheets, rules and texts by a reader's words, a page at a time; `after` leads on. */
export async function GET(request: Request): Promise<Response> {
  return counted(request, async () => {
    const url = new URL(request.url);
    const asked = readValue(Object.fromEntries(url.searchParams), searchParameters);
    if (!asked.ok) return problemResponse(asked.error);
    const { hits, count, isMore, query, nearest } = await searchPages(makeCtx(), asked.value);
    const end = asked.value.offset + hits.length;
    const after = hits.length > 0 && end < count ? markOf(String(end)) : null;
    const response = jsonResponse(request, { hits, count, more: isMore, read: query.read, mended: query.mended, nearest, after });
    if (after === null) return response;
    url.searchParams.set('after', after);
    response.headers.set('link', `<${url.pathname}${url.search}>; rel="next"`);
    return response;
  });
}

export const OPTIONS = (): Response => preflight('GET');
