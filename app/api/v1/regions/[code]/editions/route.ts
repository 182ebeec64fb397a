import { words } from '@/lib/kernel/words';
import { listEditions } from '@/lib/regions/list-editions';
import { counted, jsonResponse, preflight, problem } from '@/lib/server/api';
import { makeCtx } from '@/lib/server/ctx';
import { problemResponse } from '@/lib/server/problem';

type Context = { readonly params: Promise<{ readonly code: string }> };

export async function GET(request: Request, { params }: Context): Promise<Response> {
  return counted(request, async () => {
    const { code } = await params;
    const editions = await listEditions(makeCtx(), code);
    if (editions.ok) return jsonResponse(request, { editions: editions.value });
    return problemResponse(problem('unknown-region', [{ pointer: '', detail: words('problems.no-sheet', { code }) }]));
  });
}

export const OPTIONS = (): Response => preflight('GET');
