import { z } from 'zod';
import type { AccountId } from '@/lib/access/domain/actor';
import { FILE_TYPES, type FileId, type KeptFile, type Sent } from '@/lib/files/domain/kept-file';

export const fileRow = z
  .object({
    id: z.string(),
    store_key: z.string(),
    sha256: z.string(),
    type: z.enum(FILE_TYPES),
    bytes: z.number(),
    name: z.string(),
    owner_id: z.string().nullable(),
    purpose: z.enum(['page-seen']),
    state: z.enum(['coming', 'ready', 'gone']),
    made_at: z.date(),
  })
  .transform((row): KeptFile => ({
    id: row.id as FileId,
    storeKey: row.store_key,
    sha256: row.sha256,
    type: row.type,
    bytes: row.bytes,
    name: row.name,
    ownerId: row.owner_id as AccountId | null,
    purpose: row.purpose,
    state: row.state,
    madeAt: row.made_at,
  }));

export const sentRow = z.object({ files: z.coerce.number(), bytes: z.coerce.number() }).transform((row): Sent => row);
