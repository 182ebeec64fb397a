import 'server-only';
import { createHash, randomBytes } from 'node:crypto';

/** 256 random bits in base64url, 43 characters: what stands in a mailed link. */
export const newToken = (): string => randomBytes(32).toString('base64url');

/** A token as it is kept: SHA-256, 32 bytes. */
export const tokenHash = (token: string): Buffer => createHash('sha256').update(token).digest();

/** 16 hexadecimal digits that name a session's row in a form, and can be used for nothing else. */
export const handleOf = (id: Buffer): string => createHash('sha256').update('handle').update(id).digest('hex').slice(0, 16);
