import { z } from 'zod';

/** The place of a rule or a term in the editions. */
export type Home = { readonly region: string; readonly edition: number; readonly inUse: number };

export const homeRow = z
  .object({ region: z.string(), edition_number: z.number(), in_use: z.number() })
  .transform(({ region, edition_number, in_use }): Home => ({ region, edition: edition_number, inUse: in_use }));
