import { err, type Result } from '@/lib/kernel/result';
import { carryOverInput, type AmendmentInput } from '@/lib/regions/amendment-schema';
import { carryOver, type CarryOverRefusal } from '@/lib/regions/carry-over';
import type { ActorCtx } from '@/lib/server/actor-ctx';

const PREFIX = 'choice.';

/** Fields called `choice.<what collides>` say whose words are to stand. */
export async function carryChosen(
  ctx: ActorCtx,
  { key, id }: AmendmentInput,
  form: FormData,
): Promise<Result<{ readonly base: number }, CarryOverRefusal | { readonly kind: 'form' }>> {
  const choices = [...form].flatMap(([name, value]) => (name.startsWith(PREFIX) ? [[name.slice(PREFIX.length), value] as const] : []));
  const input = carryOverInput.safeParse({ key, id, choices: Object.fromEntries(choices) });
  return input.success ? carryOver(ctx, input.data) : err({ kind: 'form' });
}
