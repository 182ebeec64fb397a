import { listRegions } from '@/lib/regions/list-regions';
import { counted, jsonResponse, preflight } from '@/lib/server/api';
import { makeCtx } from '@/lib/server/ctx';

export async function GET(request: Request): Promise<Response> {
  return counted(request, async () => jsonResponse(request, { regions: await listRegions(makeCtx()) }));
}

export const OPTIONS = (): Response => preflight('GET');
