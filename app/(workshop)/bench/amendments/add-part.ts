import { notFound } from 'next/navigation';
import { blankItem } from '@/lib/regions/blank-form';
import { amendmentId } from '@/lib/regions/amendment-schema';
import { freshId } from '@/lib/regions/domain/fresh-id';
import { itemOf, ITEM_LISTS, keyIn, type ItemKey, type ItemList } from '@/lib/regions/domain/sheet-items';
import type { OwnAmendment } from '@/lib/regions/domain/amendment-view';
import { keepEntry } from '@/lib/regions/keep-entry';
import { readDraft } from '@/lib/regions/read-draft';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { draftPage, itemPage } from './item-address';
import { writable } from './keep-typed';

const textOf = (form: FormData, name: string): string => {
  const value = form.get(name);
  return typeof value === 'string' ? value.trim() : '';
};

/** Begins the form of something new and answers with its page. What is there already is opened instead. */
export async function addPart(ctx: ActorCtx, form: FormData): Promise<string> {
  const id = amendmentId.safeParse(form.get('id'));
  const list = ITEM_LISTS.find((one) => one === form.get('list'));
  if (!id.success || list === undefined) notFound();
  const draft = await readDraft(ctx, { id: id.data });
  if (!draft.ok) notFound();
  const name = textOf(form, 'name');
  if (name === '') return `${draftPage(id.data)}/${list}/new?why=name`;
  return beginForm(ctx, draft.value, { list, name, topic: textOf(form, 'topic') });
}

type Wanted = { readonly list: ItemList; readonly name: string; readonly topic: string };

async function beginForm(ctx: ActorCtx, draft: OwnAmendment, { list, name, topic }: Wanted): Promise<string> {
  const { id } = draft.amendment;
  const key = keyFor(draft, list, name);
  const isThere = itemOf(draft.document, key) !== null || draft.entries.some(({ item }) => item === key);
  if (isThere) return itemPage(id, key);
  const values = writable({ ...blankItem(list, draft.document), ...firstFields(list, name, topic) });
  const kept = await keepEntry(ctx, { id, item: key, version: 0, values });
  return kept.ok ? itemPage(id, key) : `${draftPage(id)}?why=${kept.error.kind}`;
}

/** Layers go by the place they are, contacts by their place in the list, all else by an id made of its name. */
function keyFor({ document, entries }: OwnAmendment, list: ItemList, name: string): ItemKey {
  if (list === 'memberships') return keyIn(list, name);
  if (list === 'authorities' || list === 'accreditation') return keyIn(list, String(document[list].length + 1));
  const taken = [...document[list].map(({ id }) => keyIn(list, id)), ...entries.map(({ item }) => item)];
  const prefix = list === 'rules' ? document.code : null;
  return keyIn(list, freshId({ name, prefix, isTaken: (id) => taken.includes(keyIn(list, id)) }));
}

function firstFields(list: ItemList, name: string, topic: string): Readonly<Record<string, string>> {
  switch (list) {
    case 'rules':
      return { title: name, 'payload.topic': topic };
    case 'terms':
    case 'authorities':
    case 'accreditation':
      return { name };
    case 'sources':
    case 'trials':
      return { title: name };
    case 'memberships':
      return {};
  }
}
