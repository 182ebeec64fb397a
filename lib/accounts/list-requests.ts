import 'server-only';
import { listNamed } from '@/db/account-search';
import { findRoleRequest, listWaitingRoleRequests } from '@/db/role-requests';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import type { RoleRequest } from './domain/role-request';

export type AskedRequest = RoleRequest & { readonly name: string };

const MOST = 100;

/** Requests to become an editor that wait for an answer, the oldest first. */
export async function listRequests(ctx: ActorCtx): Promise<Result<readonly AskedRequest[], AccessRefusal>> {
  const own = askSignedIn(ctx, 'role.read-requests');
  if (!own.ok) return own;
  return ok(await withNames(ctx, await listWaitingRoleRequests(ctx.db, MOST)));
}

/** One request, answered or not. */
export async function readRequest(
  ctx: ActorCtx,
  id: string,
): Promise<Result<AskedRequest, AccessRefusal | { readonly kind: 'not-found' }>> {
  const own = askSignedIn(ctx, 'role.read-requests');
  if (!own.ok) return own;
  const found = await findRoleRequest(ctx.db, id);
  const [request] = found === null ? [] : await withNames(ctx, [found]);
  return request === undefined ? err({ kind: 'not-found' }) : ok(request);
}

async function withNames({ db }: ActorCtx, requests: readonly RoleRequest[]): Promise<readonly AskedRequest[]> {
  const names = await listNamed(
    db,
    requests.map(({ accountId }) => accountId),
  );
  return requests.map((request) => ({ ...request, name: names.find(({ id }) => id === request.accountId)?.name ?? '' }));
}
