import { z } from 'zod';
import type { Json } from '@/lib/kernel/canonical-json';

/** A request that was carried out: who asked for what, and what they were answered. */
export type KeptRequest = { readonly who: string; readonly act: string; readonly inputHash: string; readonly answer: string };

export const requestKeyRow = z
  .object({ who: z.string(), act: z.string(), input_hash: z.string(), answer: z.string() })
  .transform(({ input_hash, ...row }): KeptRequest => ({ ...row, inputHash: input_hash }));

/** The answer as it was given the first time. It is of the type of the same act, since a key is bound to its act. */
export function answerLike<V extends Json>(text: string, _work: (...given: never[]) => Promise<{ ok: true; value: V } | { ok: false }>): V {
  return JSON.parse(text) as V;
}
