import 'server-only';
import type { Actor } from '@/lib/access/domain/actor';
import { clientAddress } from './client-address';
import { makeCtx, type Ctx } from './ctx';
import { ownOrigin } from './own-site';
import { currentActor } from './session';

/** What a use case may touch that asks who is there: `from` is the client's address as far as limits need it, `site` our own origin. */
export type ActorCtx = Ctx & { readonly actor: Actor; readonly from: string; readonly site: string };

/** Made anew for every call of an action or a handler; the session's row is read once a request. */
export async function makeActorCtx(): Promise<ActorCtx> {
  return { ...makeCtx(), actor: await currentActor(), from: await clientAddress(), site: ownOrigin() };
}
