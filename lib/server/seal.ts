import 'server-only';
import { createCipheriv, createDecipheriv, createHmac, hkdfSync, randomBytes } from 'node:crypto';
import { readEnv } from './env';

/** What a key is for. Each purpose has a key of its own, so that nothing sealed for one can be shown as another. */
type Purpose = 'session' | 'second-factor' | 'kept-form' | 'recovery-code' | 'session-id' | 'wish' | 'doubt' | 'form-stamp' | 'file-link';

const IV = 12;
const TAG = 16;

function keyFor(purpose: Purpose): Buffer {
  const { secret } = readEnv();
  if (secret === null) throw new Error('FOOTRING_SECRET is not set: nothing can be signed or sealed.');
  return Buffer.from(hkdfSync('sha256', Buffer.from(secret, 'base64'), '', `footring ${purpose}`, 32));
}

/** The key of the session cookie, as next-auth takes it. */
export const sessionSecret = (): string => keyFor('session').toString('base64');

/** AES-256-GCM: initial value, tag, text. `owner` is bound to it: it opens for no other. */
export function seal(purpose: Purpose, owner: string, plain: Buffer): Buffer {
  const iv = randomBytes(IV);
  const cipher = createCipheriv('aes-256-gcm', keyFor(purpose), iv).setAAD(Buffer.from(owner));
  const text = Buffer.concat([cipher.update(plain), cipher.final()]);
  return Buffer.concat([iv, cipher.getAuthTag(), text]);
}

/** What was sealed, or null when it was sealed for another purpose or owner, under another secret, or was changed. */
export function unseal(purpose: Purpose, owner: string, sealed: Buffer): Buffer | null {
  if (sealed.length < IV + TAG) return null;
  const cipher = createDecipheriv('aes-256-gcm', keyFor(purpose), sealed.subarray(0, IV), { authTagLength: TAG })
    .setAAD(Buffer.from(owner))
    .setAuthTag(sealed.subarray(IV, IV + TAG));
  const text = cipher.update(sealed.subarray(IV + TAG));
  try {
    return Buffer.concat([text, cipher.final()]);
  } catch {
    return null;
  }
}

/** 32 bytes that only this site can make of a text. */
export const keyedHash = (purpose: Purpose, text: string): Buffer => createHmac('sha256', keyFor(purpose)).update(text).digest();
