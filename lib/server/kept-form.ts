import 'server-only';
import { createHash, randomBytes } from 'node:crypto';
import { cookies } from 'next/headers';
import { z } from 'zod';
import { deleteOldKeptForms, findKeptForm, putKeptForm } from '@/db/kept-forms';
import { earlier } from '@/lib/accounts/domain/session-age';
import { makeCtx } from './ctx';
import type { FormState } from './define-action';
import { env } from './env';
import { seal, unseal } from './seal';

const KEPT_MS = 60 * 60_000;
const SWEEP = 200;
const GUEST = /^[A-Za-z0-9_-]{43}$/;

const text = z.union([z.string(), z.array(z.string())]);
const stateText = z.object({
  key: z.uuid(),
  values: z.record(z.string(), text),
  errors: z.record(z.string(), z.string()),
  tries: z.number().int(),
});

// Its name may not begin with that of the session's cookie: next-auth would read it as a further piece of that one.
function guestCookie(): { name: string; options: { httpOnly: true; sameSite: 'lax'; path: '/'; secure: boolean } } {
  const secure = env.site.startsWith('https://');
  return { name: secure ? '__Host-kept-forms' : 'kept-forms', options: { httpOnly: true, sameSite: 'lax', path: '/', secure } };
}

async function guest(): Promise<string | null> {
  const value = (await cookies()).get(guestCookie().name)?.value;
  return value !== undefined && GUEST.test(value) ? value : null;
}

const ownerOf = (token: string): Buffer => createHash('sha256').update(token).digest();

/**
 * Keeps what was typed for an hour, sealed, for the browser it was typed in: a refused form without script, and one whose session
 * was over, are shown again from here. Answers with the query that shows it. Passwords and codes never get this far.
 */
export async function keepForm(state: FormState): Promise<string> {
  const { db, now } = makeCtx();
  await deleteOldKeptForms(db, earlier(now, KEPT_MS), SWEEP);
  const token = (await guest()) ?? randomBytes(32).toString('base64url');
  const { name, options } = guestCookie();
  (await cookies()).set(name, token, { ...options, maxAge: KEPT_MS / 1000 });
  const sealed = seal('kept-form', state.key, Buffer.from(JSON.stringify(state)));
  await putKeptForm(db, { id: state.key, owner: ownerOf(token), sealed, at: now });
  return `look=${state.key}`;
}

/** The form kept under that key in this browser, or null. */
export async function findKept(look: unknown): Promise<FormState | null> {
  const token = await guest();
  if (token === null || !z.uuid().safeParse(look).success) return null;
  const key = String(look);
  const { db, now } = makeCtx();
  const sealed = await findKeptForm(db, key, ownerOf(token), earlier(now, KEPT_MS));
  const plain = sealed === null ? null : unseal('kept-form', key, sealed);
  return plain === null ? null : stateText.parse(JSON.parse(plain.toString('utf8')));
}
