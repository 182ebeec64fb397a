import { showTable } from '@/app/(desk)/sorting-table/show-table';
import { waitingQuery } from '@/lib/regions/amendment-schema';
import { waitingStamp } from '@/lib/regions/waiting-stamp';
import { makeActorCtx } from '@/lib/server/actor-ctx';
import { answering } from '@/lib/server/api';

const PRIVATE = { 'cache-control': 'no-store' };

/** The sorting table of whoever is signed in, as the page shows it; nothing where the stamp they know still holds. */
export async function GET(request: Request): Promise<Response> {
  const response = await answering(async () => {
    const asked = Object.fromEntries(new URL(request.url).searchParams);
    const query = waitingQuery.parse(asked);
    const ctx = await makeActorCtx();
    const stamp = await waitingStamp(ctx, query);
    // Whoever may not see it is told no more than that it is not there for them.
    if (!stamp.ok) return new Response(null, { status: stamp.error.kind === 'not-allowed' ? 404 : 401, headers: PRIVATE });
    if (asked['stamp'] === stamp.value) return new Response(null, { status: 204, headers: PRIVATE });
    const table = await showTable(ctx, query);
    return table.ok ? Response.json(table.value, { headers: PRIVATE }) : new Response(null, { status: 401, headers: PRIVATE });
  });
  response.headers.delete('access-control-allow-origin');
  return response;
}
