import { z } from 'zod';
import { canonicalJson, type Json } from '@/lib/kernel/canonical-json';

export const copyRow = z
  .object({ document: z.union([z.string(), z.looseObject({})]), made_at: z.date() })
  .transform(({ document, made_at }) => ({
    text: typeof document === 'string' ? document : canonicalJson(document as Json),
    madeAt: made_at,
  }));
