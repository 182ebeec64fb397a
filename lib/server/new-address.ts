import 'server-only';
import { randomBytes } from 'node:crypto';

/** An address nobody can guess: 128 random bits in base64url, 22 characters. */
export function newAddress(): string {
  return randomBytes(16).toString('base64url');
}
