import { notFound, redirect } from 'next/navigation';
import { remarksAnchor } from '@/components/review/anchors';
import type { Review } from '@/lib/regions/domain/amendment-view';
import { amendmentId } from '@/lib/regions/amendment-schema';
import { openForReview } from '@/lib/regions/open-for-review';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { enter } from '@/lib/server/lead-on';

export type FoundReview = { readonly ctx: ActorCtx; readonly review: Review };

/** The address of an amendment's page, or of one of its decisions. */
export const pageOf = (id: string, page = ''): string => `/sorting-table/${encodeURIComponent(id)}${page === '' ? '' : `/${page}`}`;

/** Back at the line that something was just kept on. */
export const atLine = (id: string, line: string): string => `${pageOf(id)}?at=${encodeURIComponent(line)}&kept=yes#${remarksAnchor(line)}`;

type Approved =
  | { readonly outcome: 'in-use'; readonly region: string; readonly edition: number }
  | { readonly outcome: 'once-approved' | 'refused-stale' };

/** The sorting table, with what an approval came to. */
export const decidedAt = (approved: Approved, id: string): string =>
  approved.outcome === 'in-use'
    ? `/sorting-table?done=in-use&place=${approved.region}&edition=${String(approved.edition)}`
    : `/sorting-table?done=${approved.outcome}&of=${id}`;

/** The amendment of a page, for whoever may judge; leads to the door of what is missing, or there is no such page. */
export async function findReview(id: string, page = ''): Promise<FoundReview> {
  const { ctx } = await enter('amendment.judge', pageOf(id, page));
  const parsed = amendmentId.safeParse(id);
  const found = parsed.success ? await openForReview(ctx, { id: parsed.data }) : null;
  if (found?.ok !== true) notFound();
  return { ctx, review: found.value };
}

/** The same for the page of a decision: who wrote the amendment reads it, and decides nothing. */
export async function findToDecide(id: string, page: string): Promise<FoundReview> {
  const found = await findReview(id, page);
  if (found.review.isOwn) redirect(pageOf(id));
  return found;
}
