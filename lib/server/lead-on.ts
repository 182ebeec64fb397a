import 'server-only';
import { notFound, redirect } from 'next/navigation';
import type { SignedIn } from '@/lib/access/domain/actor';
import { mayNow, type Action, type NotNow } from '@/lib/access/domain/policy';
import { makeActorCtx, type ActorCtx } from './actor-ctx';
import type { FormState } from './define-action';
import { keepForm } from './kept-form';
import type { TooMany } from './limits';
import { currentSession, type CurrentSession } from './session';

const DOORS: Readonly<Record<Exclude<NotNow, 'not-allowed'>, string>> = {
  'sign-in': '/sign-in?why=go-on',
  'sign-in-again': '/sign-in/again',
  'second-factor-needed': '/sign-in/second-factor',
  'confirm-first': '/bench?first=confirm',
};

/** Where somebody has to go first, to come back to `here` afterwards. Null for what no step of theirs can change. */
export function doorOf(kind: NotNow, here: string): string | null {
  if (kind === 'not-allowed') return null;
  const door = DOORS[kind];
  return `${door}${door.includes('?') ? '&' : '?'}next=${encodeURIComponent(here)}`;
}

const isNotNow = (kind: string): kind is NotNow => kind === 'not-allowed' || Object.hasOwn(DOORS, kind);

/** For an action's `lead`: to the door of what is missing, with what was typed kept at `page`; or to the page that says to wait. */
export const leadFrom =
  (page: string) =>
  async (refusal: { readonly kind: string } | TooMany, state: FormState): Promise<string | null> => {
    if ('retryAfterS' in refusal) return `/too-many?s=${refusal.retryAfterS}`;
    if (!isNotNow(refusal.kind) || refusal.kind === 'not-allowed') return null;
    return doorOf(refusal.kind, `${page}?${await keepForm(state)}`);
  };

/** For an action's `keep`: the page of the form with what was typed. */
export const keepAt =
  (page: string) =>
  async (state: FormState): Promise<string> =>
    `${page}?${await keepForm(state)}`;

/** Whoever is signed in, with the session they came in. */
export type Entered = { readonly ctx: ActorCtx; readonly actor: SignedIn; readonly session: CurrentSession };

/**
 * For a page or a form without fields: who is there, if they may do that now. Leads to the door of what is missing; for what one's
 * role cannot do there is no page.
 */
export async function enter(action: Action, here: string): Promise<Entered> {
  const ctx = await makeActorCtx();
  const may = mayNow(ctx.actor, action, ctx.now);
  const session = await currentSession();
  if (may.ok && ctx.actor.kind === 'account' && session !== null) return { ctx, actor: ctx.actor, session };
  const door = doorOf(may.ok ? 'sign-in' : may.error.kind, here);
  if (door === null) notFound();
  redirect(door);
}
