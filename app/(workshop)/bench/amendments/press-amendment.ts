import { notFound, redirect } from 'next/navigation';
import { amendmentInput, itemInput, type AmendmentInput, type ItemInput } from '@/lib/regions/amendment-schema';
import type { Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { enter } from '@/lib/server/lead-on';
import { draftPage } from './item-address';

type Press<Input> = {
  readonly work: (ctx: ActorCtx, input: Input) => Promise<Result<unknown, { readonly kind: string }>>;
  /** What the page says afterwards. */
  readonly done: string;
};

/** One act on a whole amendment, with nothing to fill in: does it and leads back to its page. */
export async function pressAmendment(form: FormData, press: Press<AmendmentInput>): Promise<never> {
  const input = amendmentInput.safeParse({ key: form.get('key'), id: form.get('id') });
  if (!input.success) notFound();
  return pressed(input.data, press);
}

/** The same for one part of it. */
export async function pressItem(form: FormData, press: Press<ItemInput>): Promise<never> {
  const input = itemInput.safeParse({ key: form.get('key'), id: form.get('id'), item: form.get('item') });
  if (!input.success) notFound();
  return pressed(input.data, press);
}

async function pressed<Input extends AmendmentInput>(input: Input, { work, done }: Press<Input>): Promise<never> {
  const page = draftPage(input.id);
  const { ctx } = await enter('amendment.write', page);
  const result = await work(ctx, input);
  if (!result.ok && result.error.kind === 'not-found') notFound();
  redirect(result.ok ? `${page}?done=${done}` : `${page}?why=${result.error.kind}`);
}
