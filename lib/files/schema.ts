import { z } from 'zod';
import { FILE_TYPES, type FileId } from './domain/kept-file';

export const fileId = z.uuid().transform((id) => id as FileId);

/** What has to stand in the form before the file. A page adds what it needs to find its way back; that is nothing to us. */
export const uploadFields = z.object({
  /** Of the form: one a submission. */
  key: z.uuid(),
});

/** Of a signed link's address: seconds since 1970, and the signature. */
export const linkQuery = z.strictObject({
  until: z
    .string()
    .regex(/^[1-9]\d{0,11}$/)
    .transform(Number),
  sig: z.string().regex(/^[A-Za-z0-9_-]{43}$/),
});
export type LinkQuery = z.output<typeof linkQuery>;

/** What the amendment's editor keeps of a file, in the source that was read in it. */
export const fileFingerprint = z.strictObject({
  sha256: z.string().regex(/^[0-9a-f]{64}$/),
  type: z.enum(FILE_TYPES),
  bytes: z.int().positive(),
});
