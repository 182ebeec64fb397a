import 'server-only';
import { listReadings } from '@/db/amendment-readings';
import { listJudges } from '@/db/account-search';
import { findFileBySha } from '@/db/files';
import { findAmendment, noteOpened, type StoredAmendment } from '@/db/amendments';
import type { AccountId } from '@/lib/access/domain/actor';
import { POLICY, type AccessRefusal } from '@/lib/access/domain/policy';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { askSignedIn } from '@/lib/server/ask-signed-in';
import { isWaiting, mayModeratorsRead, type Amendment } from './domain/amendment';
import type { ClaimToRead, Review } from './domain/amendment-view';
import { approvalsNeeded, firstApproval } from './domain/approval';
import { claimsToRead } from './domain/claims-to-read';
import type { Sheet } from './domain/sheet';
import { examineFully } from './examine-amendment';
import { readAlsoOpen, readBase, readStale, readTalk } from './read-around';

/** How long somebody counts as looking at it. */
const OPEN_MS = 15 * 60_000;

/** All that a moderator sees of an amendment that was sent, and a note for the others that they look at it. Drafts are not there (S28). */
export async function openForReview(
  ctx: ActorCtx,
  { id }: { readonly id: string },
): Promise<Result<Review, AccessRefusal | { readonly kind: 'not-found' }>> {
  const own = askSignedIn(ctx, 'amendment.judge');
  if (!own.ok) return own;
  const who = own.value.id;
  const stored = await findAmendment(ctx.db, id);
  if (stored === null || !mayModeratorsRead(stored.amendment)) return err({ kind: 'not-found' });
  const { amendment } = stored;
  const isOwn = amendment.authorId === who;
  const review = await reviewOf(ctx, stored, who);
  if (!isOwn && isWaiting(amendment.state)) await noteOpened(ctx.db, amendment.id, who, ctx.now);
  return ok(review);
}

async function reviewOf(ctx: ActorCtx, stored: StoredAmendment, who: AccountId): Promise<Review> {
  const { amendment, document } = stored;
  const base = await readBase(ctx, amendment);
  const { comparison, findings } = await examineFully(ctx, stored);
  const talk = await readTalk(ctx, amendment, who, [amendment.authorId, amendment.openedBy]);
  const first = firstApproval(amendment, talk.taken);
  return {
    amendment,
    name: document.name,
    author: talk.nameOf(amendment.authorId),
    isOwn: amendment.authorId === who,
    comparison,
    findings,
    claims: await readClaims(ctx, { amendment, base, document, who }),
    remarks: talk.remarks,
    decisions: talk.decisions,
    needed: approvalsNeeded(base, document),
    given: first === null ? 0 : 1,
    gaveIt: first?.by === who,
    othersLeft: await countOthers(ctx, [amendment.authorId, who, ...(first === null ? [] : [first.by])]),
    openElsewhere: openElsewhere(amendment, { who, now: ctx.now, nameOf: talk.nameOf }),
    alsoOpen: await readAlsoOpen(ctx, stored),
    stale: await readStale(ctx, stored),
  };
}

type Read = { readonly amendment: Amendment; readonly base: Sheet | null; readonly document: Sheet; readonly who: AccountId };

async function readClaims(ctx: ActorCtx, { amendment, base, document, who }: Read): Promise<readonly ClaimToRead[]> {
  const read = await listReadings(ctx.db, { amendment: amendment.id, version: amendment.version, reader: who });
  const claims = claimsToRead(base, document);
  const files = await readFiles(ctx, new Set(claims.flatMap(({ source }) => source.fingerprint?.sha256 ?? [])));
  return claims.map((claim) => ({
    ...claim,
    fileId: files.get(claim.source.fingerprint?.sha256 ?? '') ?? null,
    isRead: read.has(claim.key),
  }));
}

/** The kept pages of these contents, by their hash. */
async function readFiles(ctx: ActorCtx, hashes: ReadonlySet<string>): Promise<ReadonlyMap<string, string>> {
  const found = new Map<string, string>();
  for (const sha256 of hashes) {
    const file = await findFileBySha(ctx.db, sha256);
    if (file !== null) found.set(sha256, file.id);
  }
  return found;
}

/** Moderators with an account they can sign in to, without these. */
async function countOthers(ctx: ActorCtx, without: readonly AccountId[]): Promise<number> {
  const judges = await listJudges(ctx.db, POLICY['amendment.judge']);
  return judges.filter((id) => !without.includes(id)).length;
}

type Looking = { readonly who: AccountId; readonly now: Date; readonly nameOf: (id: string) => string };

function openElsewhere({ openedBy, openedAt, state }: Amendment, { who, now, nameOf }: Looking): Review['openElsewhere'] {
  if (openedBy === null || openedAt === null || openedBy === who || !isWaiting(state)) return null;
  return now.getTime() - openedAt.getTime() <= OPEN_MS ? { by: nameOf(openedBy), at: openedAt } : null;
}
