import { notFound } from 'next/navigation';
import type { NotNow } from '@/lib/access/domain/policy';
import { amendmentId, type SaveItemInput } from '@/lib/regions/amendment-schema';
import { applyDo, placeOfDo } from '@/lib/regions/domain/entry-do';
import { isItemKey } from '@/lib/regions/domain/sheet-items';
import { keepEntry } from '@/lib/regions/keep-entry';
import { saveItem } from '@/lib/regions/save-item';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { keepForm } from '@/lib/server/kept-form';
import { doorOf } from '@/lib/server/lead-on';
import type { SentEntry } from './entry-form';
import { freshKey } from './fresh-key';
import { draftPage, itemPage } from './item-address';

type Refused = { readonly kind: string };
const NOT_NOW: readonly NotNow[] = ['sign-in', 'sign-in-again', 'second-factor-needed', 'confirm-first'];

/** Saves the item, and answers with where to go: back to the whole, or to the form with what is to be mended. */
export async function saveTyped(ctx: ActorCtx, input: SaveItemInput): Promise<string> {
  const saved = await saveItem(ctx, input);
  if (!saved.ok) return whereRefused(saved.error, input);
  if (saved.value.saved) return `${draftPage(input.id)}?saved=${encodeURIComponent(saved.value.item)}`;
  return `${itemPage(input.id, input.item)}?mend=${String(saved.value.version)}`;
}

/** Keeps the form as the button leaves it, and answers with the page that shows it again. */
export async function keepTyped(ctx: ActorCtx, input: SaveItemInput, act: string): Promise<string> {
  const values = { ...applyDo(input.values, act) };
  const { id, item, version } = input;
  const kept = await keepEntry(ctx, { id, item, version, values: writable(values) });
  if (!kept.ok) return whereRefused(kept.error, input);
  const at = placeOfDo(values, act);
  return `${itemPage(id, item)}?kept=${String(kept.value.version)}${at === null ? '' : `&at=${encodeURIComponent(at)}`}`;
}

export const writable = (values: Readonly<Record<string, string | readonly string[]>>): Record<string, string | string[]> =>
  Object.fromEntries(Object.entries(values).map(([name, value]) => [name, typeof value === 'string' ? value : [...value]]));

/** Nothing typed is lost: it waits at the form, sealed, while somebody signs in again or looks at what another tab kept. */
async function whereRefused({ kind }: Refused, { key, id, item, values }: SaveItemInput): Promise<string> {
  if (kind === 'not-found' || kind === 'not-allowed') notFound();
  if (kind === 'already-decided' || kind === 'own-amendment') return `${draftPage(id)}?why=already-decided`;
  const look = await keepForm({ key, values, errors: {}, tries: 1 });
  const page = `${itemPage(id, item)}?${look}`;
  const step = NOT_NOW.find((one) => one === kind);
  return (step === undefined ? null : doorOf(step, page)) ?? `${page}&why=${kind}`;
}

/** A form with more in it than an item may hold is shown again with all of it, to be shortened. */
export async function whereUnread({ id, item, values }: SentEntry): Promise<string> {
  if (!amendmentId.safeParse(id).success || !isItemKey(item)) return '/bench/amendments?why=form';
  return `${itemPage(id, item)}?${await keepForm({ key: freshKey(), values, errors: {}, tries: 1 })}&why=too-much`;
}
