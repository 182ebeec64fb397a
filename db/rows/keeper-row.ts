import { z } from 'zod';

/** An account that keeps a sheet. Whether it may still be named is seen from the account. */
export type KeeperRow = { readonly region: string; readonly accountId: string; readonly since: Date };

export const keeperRow = z
  .object({ region: z.string(), account_id: z.string(), since: z.date() })
  .transform(({ region, account_id, since }): KeeperRow => ({ region, accountId: account_id, since }));
