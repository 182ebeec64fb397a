import 'server-only';
import { listEntries } from '@/db/amendment-entries';
import { findAmendment, updateAmendment } from '@/db/amendments';
import { writeDayBook } from '@/db/day-book';
import { findNumberInUse } from '@/db/editions';
import type { Trx } from '@/db/transaction';
import type { AccountId } from '@/lib/access/domain/actor';
import type { AccessRefusal } from '@/lib/access/domain/policy';
import type { Finding } from '@/lib/checks/domain/finding';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { change, type ChangeRefusal } from '@/lib/server/change';
import type { SendInput } from './amendment-schema';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { judgeAct } from './domain/amendment';
import type { CheckedAmendment } from './domain/amendment-view';
import { changedItems } from './domain/changed-items';
import { claimsWithoutPassage } from './domain/claims-to-read';
import type { Sheet } from './domain/sheet';
import type { ItemKey } from './domain/sheet-items';
import { errorsIn, examineFully, type Examined } from './examine-amendment';
import { lockFor, type ActRefusal, type LockedAmendment } from './lock-for';
import { readBase } from './read-around';

/** Why it cannot be sent, each with what is to be mended. */
export type NotReady =
  /** It was changed since the page was shown. */
  | { readonly kind: 'superseded'; readonly version: number }
  /** Something was typed and not saved. */
  | { readonly kind: 'unfinished'; readonly items: readonly ItemKey[] }
  | { readonly kind: 'stale'; readonly to: number | null }
  | { readonly kind: 'nothing-changed' }
  | { readonly kind: 'findings'; readonly errors: readonly Finding[] }
  /** Claims, as `rules/dk-register#0`, without the passage they rest on. */
  | { readonly kind: 'no-passage'; readonly claims: readonly string[] }
  /** Trial pieces that come out otherwise, without a word why that is meant. */
  | { readonly kind: 'intended-missing'; readonly trials: readonly string[] };

export type SendRefusal = AccessRefusal | ChangeRefusal | ActRefusal | NotReady;
type Sent = { readonly version: number };
type Seen = Examined & CheckedAmendment & { readonly base: Sheet | null };

const TRIES = 3;

/** Sends an amendment to the moderators. What the checks find wrong keeps it here. REG-54 */
export async function sendAmendment(ctx: ActorCtx, input: SendInput): Promise<Result<Sent, SendRefusal>> {
  const own = askSignedIn(ctx, 'amendment.write');
  if (!own.ok) return own;
  for (let tries = 0; tries < TRIES; tries += 1) {
    // Checked before the transaction, which then only sees whether it is the same that was checked.
    const seen = await look(ctx, own.value.id, input);
    const sent = await send(ctx, own.value.id, { input, seen });
    if (sent.ok) return sent;
    const { error } = sent;
    if (error.kind !== 'look-again') return err(error);
  }
  return err({ kind: 'busy' });
}

async function look(ctx: ActorCtx, who: AccountId, { id }: SendInput): Promise<Seen | null> {
  const stored = await findAmendment(ctx.db, id);
  if (stored === null || !judgeAct(stored.amendment, who, 'send').ok) return null;
  return { ...(await examineFully(ctx, stored)), base: await readBase(ctx, stored.amendment) };
}

type Again = { readonly kind: 'look-again' };
type Sending = { readonly input: SendInput; readonly seen: Seen | null };

async function send(ctx: ActorCtx, who: AccountId, { input, seen }: Sending): Promise<Result<Sent, SendRefusal | Again>> {
  const { key, id, version, summary, intended } = input;
  const asked = { key, who, act: 'regions.send-amendment', input: { id, version, summary, intended } };
  return change(ctx, asked, async (trx): Promise<Result<Sent, SendRefusal | Again>> => {
    const locked = await lockFor(trx, { id, who, act: 'send' });
    if (!locked.ok) return locked;
    const ready = await judgeReady(trx, locked.value, { input, seen });
    if (!ready.ok) return ready;
    const { amendment, next } = locked.value;
    await updateAmendment(trx, id, version, { state: next, summary, intended: ready.value, sentAt: ctx.now, at: ctx.now });
    await writeDayBook(trx, {
      actorId: who,
      did: 'amendment.send',
      subject: { kind: 'amendment', id },
      reason: null,
      details: { region: amendment.region },
      at: ctx.now,
    });
    return ok({ version: version + 1 });
  });
}

type Words = Readonly<Record<string, string>>;

/** Answers with the words for the trial pieces that come out otherwise; those of others are not kept. */
async function judgeReady(
  trx: Trx,
  { amendment, document }: LockedAmendment,
  { input, seen }: Sending,
): Promise<Result<Words, NotReady | Again>> {
  if (amendment.version !== input.version) return err({ kind: 'superseded', version: amendment.version });
  const entries = await listEntries(trx, amendment.id);
  if (entries.length > 0) return err({ kind: 'unfinished', items: entries.map(({ item }) => item) });
  const inUse = await findNumberInUse(trx, amendment.region);
  if (inUse !== amendment.baseNumber) return err({ kind: 'stale', to: inUse });
  if (seen?.version !== amendment.version) return err({ kind: 'look-again' });
  if (changedItems(seen.base, document).length === 0) return err({ kind: 'nothing-changed' });
  return judgeSeen(document, seen, input);
}

function judgeSeen(document: Sheet, { base, findings, comparison }: Seen, { intended }: SendInput): Result<Words, NotReady> {
  const errors = errorsIn(findings);
  if (errors.length > 0) return err({ kind: 'findings', errors });
  const claims = claimsWithoutPassage(base, document);
  if (claims.length > 0) return err({ kind: 'no-passage', claims });
  const said = comparison.trials.changed.map(({ id }) => [id, (intended[id] ?? '').trim()] as const);
  const trials = said.filter(([, words]) => words === '').map(([id]) => id);
  return trials.length > 0 ? err({ kind: 'intended-missing', trials }) : ok(Object.fromEntries(said));
}
