import { buildChecklist } from '@/lib/checks/build-checklist';
import { checkInput } from '@/lib/checks/schema';
import { words } from '@/lib/kernel/words';
import { counted, jsonResponse, preflight, problem, readBody } from '@/lib/server/api';
import { makeCtx } from '@/lib/server/ctx';
import { problemResponse } from '@/lib/server/problem';

/** Judges one piece for some places. Open to all, reads no cookie, keeps nothing unless `keep` is true. */
export async function POST(request: Request): Promise<Response> {
  return counted(request, async () => {
    const input = await readBody(request, checkInput);
    if (!input.ok) return problemResponse(input.error);
    const checklist = await buildChecklist(makeCtx(), input.value);
    if (checklist.ok) return jsonResponse(request, checklist.value);
    const { code } = checklist.error;
    const place = input.value.regions.indexOf(code);
    const fault = { pointer: `/regions/${String(place)}`, detail: words('problems.no-sheet', { code }) };
    return problemResponse(problem('unknown-region', [fault]));
  });
}

export const OPTIONS = (): Response => preflight('POST');
