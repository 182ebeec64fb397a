import { readSuggestionIndex } from '@/lib/search/read-suggestion-index';
import { counted, jsonResponse, preflight } from '@/lib/server/api';
import { makeCtx } from '@/lib/server/ctx';

/** What suggestions are made of while a reader writes. */
export async function GET(request: Request): Promise<Response> {
  return counted(request, async () => jsonResponse(request, await readSuggestionIndex(makeCtx())));
}

export const OPTIONS = (): Response => preflight('GET');
