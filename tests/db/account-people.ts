import { Secret, TOTP } from 'otpauth';
import { findAccountByEmail, insertAccount } from '@/db/accounts';
import { db } from '@/db/connection';
import { putRegion } from '@/db/regions';
import { insertSession } from '@/db/sessions';
import { inTransaction } from '@/db/transaction';
import type { AccountRole, Actor } from '@/lib/access/domain/actor';
import type { Account } from '@/lib/accounts/domain/account';
import { accountId, email } from '@/lib/accounts/schema';
import { ok } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { newId } from '@/lib/server/new-id';
import { hashPassword } from '@/lib/server/password';
import { actorOf, newSession, sessionOf, type CurrentSession } from '@/lib/server/session';

export const NOW = new Date('2026-12-01T10:00:00.000Z');
export const PASSWORD = 'slow wheel, wet hands';
export const SITE = 'https://footring.example.test';
export const READER: Actor = { kind: 'reader' };
export const key = (): string => crypto.randomUUID();
export const address = (text: string) => email.parse(text);

/** A request by a reader, at an instant, from an address of its own. */
export const aCtx = (actor: Actor = READER, now = NOW, from = '192.0.2.1'): ActorCtx => ({ db, now, actor, from, site: SITE });

let hash: Promise<string> | undefined;

/** An open account with `PASSWORD`. */
export async function aPerson(
  mailbox: string,
  { role = 'maker', name = 'Mara Lindqvist' }: { role?: AccountRole; name?: string } = {},
): Promise<Account> {
  const passwordHash = await (hash ??= hashPassword(PASSWORD));
  const id = accountId.parse(newId(NOW));
  await inTransaction(db, async (trx) => {
    await insertAccount(trx, { id, email: mailbox, name, passwordHash, role, state: 'open', at: NOW });
    return ok(null);
  });
  const made = await findAccountByEmail(db, mailbox);
  if (made === null) throw new Error('The account was not made');
  return made;
}

/** A session of theirs, the request it makes, and what to read it again by. */
export async function aVisit(
  account: Account,
  { now = NOW, freshAt = now, secondFactorAt = null }: { now?: Date; freshAt?: Date; secondFactorAt?: Date | null } = {},
): Promise<{ readonly ctx: ActorCtx; readonly session: CurrentSession; readonly isLive: (at?: Date) => Promise<boolean> }> {
  const { row } = newSession({ accountId: account.id, now, agent: 'test', freshAt, secondFactorAt });
  await inTransaction(db, async (trx) => {
    await insertSession(trx, row);
    return ok(null);
  });
  const session = await sessionOf({ db, now }, row.id);
  if (session === null) throw new Error('The session was not opened');
  return { ctx: aCtx(actorOf(session), now), session, isLive: async (at = now) => (await sessionOf({ db, now: at }, row.id)) !== null };
}

type Mail = { readonly kind: string; readonly address: string; readonly body_text: string; readonly subject: string };

/** Mails in the outbox, oldest first. */
export async function mailsOf(kind?: string): Promise<readonly Mail[]> {
  const rows = (await db('outbox').select('kind', 'address', 'body_text', 'subject').orderBy('due_at')) as Mail[];
  return kind === undefined ? rows : rows.filter((mail) => mail.kind === kind);
}

/** The token in the latest mail of a kind. */
export async function tokenIn(kind: string): Promise<string> {
  const text = (await mailsOf(kind)).at(-1)?.body_text ?? '';
  return /\/([A-Za-z0-9_-]{43})\b/.exec(text)?.[1] ?? '';
}

/** Nobody, and nothing of anybody. */
export async function emptyTables(): Promise<void> {
  for (const table of [
    'outbox',
    'jobs',
    'account_exports',
    'recovery_codes',
    'account_tokens',
    'sessions',
    'role_requests',
    'request_keys',
    'kept_forms',
    'limits',
    'accounts',
  ]) {
    await db(table).del();
  }
}

/** Milliseconds. */
export const DAY = 86_400_000;
export const later = (ms: number): Date => new Date(NOW.getTime() + ms);

/** What an authenticator holds, and the code it shows at an instant. */
export const SECRET = 'GEZDGNBVGY3TQOJQGEZDGNBVGY3TQOJQ';
export const codeAt = (now: Date): string => new TOTP({ secret: Secret.fromBase32(SECRET) }).generate({ timestamp: now.getTime() });

/** A place that makers may ask to write about. */
export const aPlace = () =>
  inTransaction(db, async (trx) => {
    await putRegion(trx, { code: 'dk', name: 'Denmark', kind: 'country' });
    return ok(null);
  });
