import { makeCtx } from '@/lib/server/ctx';
import { isDatabaseAlive } from '@/lib/server/health';
import { version } from '@/lib/server/version';

/** Ready to serve: 200 when the database answers, 503 when it does not. */
export async function GET(): Promise<Response> {
  const alive = await isDatabaseAlive(makeCtx().db);
  const body = { status: alive ? 'ok' : 'unavailable', database: alive ? 'ok' : 'unavailable', version };
  return Response.json(body, { status: alive ? 200 : 503, headers: { 'cache-control': 'no-store', 'access-control-allow-origin': '*' } });
}
