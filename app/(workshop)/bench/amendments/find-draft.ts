import { notFound, redirect } from 'next/navigation';
import { cache } from 'react';
import { amendmentId } from '@/lib/regions/amendment-schema';
import type { OwnAmendment } from '@/lib/regions/domain/amendment-view';
import { readDraft } from '@/lib/regions/read-draft';
import { makeActorCtx, type ActorCtx } from '@/lib/server/actor-ctx';
import { doorOf } from '@/lib/server/lead-on';
import { draftPage } from './item-address';

const find = cache(async (id: string): Promise<{ readonly ctx: ActorCtx; readonly draft: OwnAmendment }> => {
  const given = amendmentId.safeParse(id);
  if (!given.success) notFound();
  const ctx = await makeActorCtx();
  const draft = await readDraft(ctx, { id: given.data });
  if (draft.ok) return { ctx, draft: draft.value };
  if (draft.error.kind === 'not-found') notFound();
  const door = doorOf(draft.error.kind, draftPage(id));
  if (door === null) notFound();
  redirect(door);
});

/** One's own amendment under that id, read once a request; leads to the door of what is missing, and for others it is not there. */
export const findDraft = (id: string): Promise<{ readonly ctx: ActorCtx; readonly draft: OwnAmendment }> => find(id);
