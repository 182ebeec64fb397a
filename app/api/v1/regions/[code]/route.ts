import { words } from '@/lib/kernel/words';
import { readRegionSheet } from '@/lib/regions/read-region-sheet';
import { calendarDate } from '@/lib/regions/schema';
import { counted, jsonResponse, preflight, problem, readValue } from '@/lib/server/api';
import { makeCtx } from '@/lib/server/ctx';
import { problemResponse } from '@/lib/server/problem';

type Context = { readonly params: Promise<{ readonly code: string }> };

export async function GET(request: Request, { params }: Context): Promise<Response> {
  return counted(request, async () => {
    const { code } = await params;
    const on = readValue(new URL(request.url).searchParams.get('on') ?? undefined, calendarDate.optional(), ['on']);
    if (!on.ok) return problemResponse(on.error);
    const sheet = await readRegionSheet(makeCtx(), { code, on: on.value });
    if (!sheet.ok) return problemResponse(problem('unknown-region', [{ pointer: '', detail: words('problems.no-sheet', { code }) }]));
    const { above: _above, inUseFrom: _inUseFrom, ...told } = sheet.value;
    return jsonResponse(request, told);
  });
}

export const OPTIONS = (): Response => preflight('GET');
