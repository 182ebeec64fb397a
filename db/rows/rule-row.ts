import { z } from 'zod';

/** The place of a rule in the editions. */
export type RuleHome = { readonly region: string; readonly edition: number; readonly inUse: number };

export const ruleHomeRow = z
  .object({ region: z.string(), edition_number: z.number(), in_use: z.number() })
  .transform(({ region, edition_number, in_use }): RuleHome => ({ region, edition: edition_number, inUse: in_use }));
