import { z } from 'zod';

/** How often a region was asked for. */
export type CountedWish = { readonly region: string; readonly count: number };

export const countedWishRow = z
  .object({ region: z.string(), times: z.coerce.number().int() })
  .transform(({ region, times }): CountedWish => ({ region, count: times }));
