import 'server-only';
import { createHash, randomBytes } from 'node:crypto';
import { getServerSession, type NextAuthOptions } from 'next-auth';
import { encode } from 'next-auth/jwt';
import { cookies, headers } from 'next/headers';
import { cache } from 'react';
import { deleteSession, findSession, touchSession, type NewSession } from '@/db/sessions';
import { READER, type AccountId, type Actor, type SecondFactorState } from '@/lib/access/domain/actor';
import { ABSOLUTE_MS, earlier, FRESH_MS, IDLE_MS, later, TOUCH_MS } from '@/lib/accounts/domain/session-age';
import type { FoundSession } from '@/lib/accounts/domain/session';
import { err, type Result } from '@/lib/kernel/result';
import { makeCtx, type Ctx } from './ctx';
import { env } from './env';
import { keyedHash, sessionSecret } from './seal';

declare module 'next-auth' {
  interface Session {
    readonly sid?: string;
  }
}

const AGE_S = ABSOLUTE_MS / 1000;
const AGENT = 200;

type CookiePlan = {
  readonly name: string;
  readonly options: { readonly httpOnly: true; readonly sameSite: 'lax'; readonly path: '/'; readonly secure: boolean };
};

/** Over https a browser takes the cookie from this very host alone; without it there is no such promise, and no such name. */
export function sessionCookie(): CookiePlan {
  const secure = env.site.startsWith('https://');
  return { name: secure ? '__Host-footring' : 'footring', options: { httpOnly: true, sameSite: 'lax', path: '/', secure } };
}

/** The token carries the session's id and nothing else; who that is stands in the row. No provider, no route: no second door. */
function authOptions(): NextAuthOptions {
  return {
    secret: sessionSecret(),
    providers: [],
    session: { strategy: 'jwt', maxAge: AGE_S },
    cookies: { sessionToken: sessionCookie() },
    logger: { error: () => undefined, warn: () => undefined, debug: () => undefined }, // a cookie of anybody's making is no news
    callbacks: {
      session: ({ session, token }) => (typeof token['sid'] === 'string' ? { ...session, sid: token['sid'] } : session),
    },
  };
}

const digest = (sid: string): Buffer => createHash('sha256').update(sid).digest();

export type CurrentSession = FoundSession & { readonly id: Buffer };

async function readSession(): Promise<CurrentSession | null> {
  if ((await cookies()).get(sessionCookie().name) === undefined) return null;
  const sid = (await getServerSession(authOptions()))?.sid;
  return sid === undefined ? null : sessionOf(makeCtx(), digest(sid));
}

/** The session of that row, if it is live; notes the visit when the last one was noted a while ago. */
export async function sessionOf({ db, now }: Ctx, id: Buffer): Promise<CurrentSession | null> {
  const found = await findSession(db, id, now, earlier(now, IDLE_MS));
  if (found === null) return null;
  if (found.seenAt < earlier(now, TOUCH_MS)) await touchSession(db, id, found.seenAt, now);
  return { ...found, id };
}

/** The session of the running request, read from its row once a request: ending a session ends it for the next one. */
export const currentSession: () => Promise<CurrentSession | null> = cache(readSession);

function factorOf({ secondFactorOn, secondFactorAt }: FoundSession): SecondFactorState {
  if (!secondFactorOn) return 'off';
  return secondFactorAt === null ? 'waiting' : 'given';
}

/** Who asks, as the session says. */
export function actorOf(session: FoundSession | null): Actor {
  if (session === null) return READER;
  const { accountId: id, role, name, confirmed } = session;
  return { kind: 'account', id, role, name, confirmed, secondFactor: factorOf(session), freshUntil: later(session.freshAt, FRESH_MS) };
}

export const currentActor = async (): Promise<Actor> => actorOf(await currentSession());

/** Does something in the session of this request; refused when it is over. */
export async function withSession<V, E>(
  work: (session: CurrentSession) => Promise<Result<V, E>>,
): Promise<Result<V, E | { readonly kind: 'sign-in' }>> {
  const session = await currentSession();
  return session === null ? err({ kind: 'sign-in' }) : work(session);
}

/** A session to be put in, and the secret its holder gets. */
export type OpenedSession = { readonly sid: string; readonly row: NewSession };

type Opening = {
  readonly accountId: AccountId;
  readonly now: Date;
  readonly agent: string;
  readonly secondFactorAt?: Date | null;
  /** When the password was typed; a mailed link proves less, and opens no delicate act. */
  readonly freshAt: Date;
  /** The key of a form: the same form sent twice opens one session. */
  readonly key?: string;
};

/** Makes a session of 256 bits that lasts 30 days at most. */
export function newSession({ accountId, now, agent, secondFactorAt = null, freshAt, key }: Opening): OpenedSession {
  const sid = (key === undefined ? randomBytes(32) : keyedHash('session-id', `${accountId} ${key}`)).toString('base64url');
  return { sid, row: { id: digest(sid), accountId, at: now, endsAt: later(now, ABSOLUTE_MS), freshAt, secondFactorAt, agent } };
}

/** What the browser says it is, for the person's own list of sessions. */
export async function clientAgent(): Promise<string> {
  return ((await headers()).get('user-agent') ?? '').replace(/[^\x20-\x7e]/g, '').slice(0, AGENT);
}

/** Gives the browser the session; the one it had, whosever it was, is over. Only from an action or a route handler. */
export async function wearSession(sid: string): Promise<void> {
  const before = await currentSession();
  if (before !== null && !before.id.equals(digest(sid))) await deleteSession(makeCtx().db, before.id);
  const { name, options } = sessionCookie();
  (await cookies()).set(name, await encode({ token: { sid }, secret: sessionSecret(), maxAge: AGE_S }), { ...options, maxAge: AGE_S });
}

/** Ends the session of this browser, in its row and in its cookie. */
export async function dropSession(): Promise<void> {
  const session = await currentSession();
  if (session !== null) await deleteSession(makeCtx().db, session.id);
  const { name, options } = sessionCookie();
  (await cookies()).set(name, '', { ...options, maxAge: 0 }); // `__Host-` needs Secure and Path again to be taken away
}
