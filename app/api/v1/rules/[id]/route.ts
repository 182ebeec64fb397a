import { words } from '@/lib/kernel/words';
import { readRule } from '@/lib/regions/read-rule';
import { counted, jsonResponse, preflight, problem } from '@/lib/server/api';
import { makeCtx } from '@/lib/server/ctx';
import { problemResponse } from '@/lib/server/problem';

type Context = { readonly params: Promise<{ readonly id: string }> };

export async function GET(request: Request, { params }: Context): Promise<Response> {
  return counted(request, async () => {
    const { id } = await params;
    const found = await readRule(makeCtx(), id);
    if (!found.ok) return problemResponse(problem('unknown-rule', [{ pointer: '', detail: words('problems.no-rule', { id }) }]));
    const { rule, edition, withdrawn } = found.value;
    return jsonResponse(request, { ...rule, edition, withdrawn });
  });
}

export const OPTIONS = (): Response => preflight('GET');
