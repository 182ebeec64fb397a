import { jobId } from '@/lib/accounts/schema';
import { readArchive } from '@/lib/accounts/read-export';
import { makeActorCtx } from '@/lib/server/actor-ctx';
import { doorOf } from '@/lib/server/lead-on';

type Context = { readonly params: Promise<{ readonly archive: string }> };

/** The archive of whoever is signed in, and of nobody else; leads to the door of what is missing. */
export async function GET(_: Request, { params }: Context): Promise<Response> {
  const id = jobId.safeParse((await params).archive);
  if (!id.success) return notThere();
  const ctx = await makeActorCtx();
  const archive = await readArchive(ctx, id.data);
  if (archive.ok) return zipOf(archive.value, ctx.now);
  if (archive.error.kind === 'not-found') return notThere();
  const door = doorOf(archive.error.kind, '/bench/account/export');
  return door === null
    ? notThere()
    : new Response(null, { status: 303, headers: { location: door, 'cache-control': 'private, no-store' } });
}

const notThere = (): Response => new Response('Not found', { status: 404, headers: { 'cache-control': 'private, no-store' } });

function zipOf(archive: Buffer, now: Date): Response {
  return new Response(new Uint8Array(archive), {
    headers: {
      'content-type': 'application/zip',
      'content-disposition': `attachment; filename="footring-${now.toISOString().slice(0, 10)}.zip"`,
      'cache-control': 'private, no-store',
    },
  });
}
