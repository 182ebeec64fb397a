import { answersInput } from '@/lib/checks/schema';
import { words } from '@/lib/kernel/words';
import { judgeReadings } from '@/lib/readings/judge-readings';
import { verdictInput } from '@/lib/readings/schema';
import { counted, jsonResponse, preflight, problem, readBody } from '@/lib/server/api';
import { makeCtx } from '@/lib/server/ctx';
import { problemResponse } from '@/lib/server/problem';

const input = verdictInput(answersInput.default({}));

/** Judges a lab's figures for one piece in some places. Open to all, reads no cookie, keeps nothing. */
export async function POST(request: Request): Promise<Response> {
  return counted(request, async () => {
    const read = await readBody(request, input);
    if (!read.ok) return problemResponse(read.error);
    const judged = await judgeReadings(makeCtx(), read.value);
    if (judged.ok) return jsonResponse(request, judged.value);
    const { code } = judged.error;
    const place = read.value.regions.indexOf(code);
    const fault = { pointer: `/regions/${String(place)}`, detail: words('problems.no-sheet', { code }) };
    return problemResponse(problem('unknown-region', [fault]));
  });
}

export const OPTIONS = (): Response => preflight('POST');
