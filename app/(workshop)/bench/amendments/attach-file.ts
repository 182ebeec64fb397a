import { notFound } from 'next/navigation';
import { readFile } from '@/lib/files/read-file';
import { fileId } from '@/lib/files/schema';
import { formOf } from '@/lib/regions/blank-form';
import { fingerprintText } from '@/lib/regions/item-form';
import { keepEntry } from '@/lib/regions/keep-entry';
import { readDraft } from '@/lib/regions/read-draft';
import type { AttachForm } from '@/lib/regions/send-form';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { itemPage } from './item-address';
import { writable } from './keep-typed';

/** Writes what names the page's content into the form of its source, and answers with that form. */
export async function attachFile(ctx: ActorCtx, { id, item, file, version }: AttachForm): Promise<string> {
  const page = itemPage(id, item);
  const [draft, kept] = await Promise.all([readDraft(ctx, { id }), readFile(ctx, fileId.parse(file))]);
  if (!draft.ok || !kept.ok || !item.startsWith('sources/')) notFound();
  const typed = draft.value.entries.find((entry) => entry.item === item)?.values ?? formOf(draft.value.document, item);
  if (typed === null) notFound();
  const values = writable({ ...typed, fingerprint: fingerprintText(kept.value) });
  const done = await keepEntry(ctx, { id, item, version, values });
  return done.ok ? `${page}?attached=${String(done.value.version)}` : `${page}?why=${done.error.kind}&file=${file}`;
}
