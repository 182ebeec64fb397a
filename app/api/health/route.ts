import { makeCtx } from '@/lib/server/ctx';
import { readHealth } from '@/lib/server/health';
import { version } from '@/lib/server/version';

/** Ready to serve: 200 when the database answers, 503 when it does not. A worker, mail or store of uploads that is not well stops no reader. */
export async function GET(): Promise<Response> {
  const health = await readHealth(makeCtx().db);
  const isReady = health.database === 'ok';
  return Response.json(
    { status: isReady ? 'ok' : 'unavailable', ...health, version },
    { status: isReady ? 200 : 503, headers: { 'cache-control': 'no-store', 'access-control-allow-origin': '*' } },
  );
}
