import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { one, type Query } from '@/app/(account)/form-words';
import { DraftFrame } from '@/components/amend/draft-frame';
import type { FormView } from '@/components/amend/form-view';
import { ItemForm } from '@/components/amend/item-form';
import { ItemNotices } from '@/components/amend/item-notices';
import { PagesSeen } from '@/components/amend/pages-seen';
import { TextPreview } from '@/components/amend/text-preview';
import { fileRefusalIn } from '@/lib/files/domain/file-refusal';
import { words } from '@/lib/kernel/words';
import { textIn } from '@/lib/regions/domain/entry';
import { readItemKey, type ItemKey } from '@/lib/regions/domain/sheet-items';
import { readFormGround } from '@/lib/regions/read-form-ground';
import { renderMarkdown } from '@/lib/server/markdown';
import { attachPage, throwAway, typed } from '../actions';
import { findDraft } from '../find-draft';
import { freshKey } from '../fresh-key';
import { draftPage, itemPage } from '../item-address';
import { drawFields } from './draw-fields';
import { readForm, type ReadForm } from './read-form';
import { titleOf } from './title-of';

type Asked = { readonly id: string; readonly item: ItemKey; readonly query: Query };

/** The page of the form of one part of an amendment. */
export async function ItemPage({ id, item, query }: Asked): Promise<ReactElement> {
  const { ctx, draft } = await findDraft(id);
  const form = await readForm(draft, item, query);
  const read = readItemKey(item);
  if (form === null || read === null) notFound();
  const { sample, ...ground } = await readFormGround(ctx, draft.document);
  const view: FormView = { ...form, ground, sources: draft.document.sources, at: one(query, 'at') ?? null };
  const { sections, fields } = drawFields({ list: read.list, view, sample, newSource: `${draftPage(id)}/sources/new` });
  const submission = freshKey();
  const title = titleOf(read.list, form.values, words(`amend.list.one.${read.list}`));
  return (
    <DraftFrame title={title} name={draft.name} back={draftPage(id)} takesFocus={false}>
      <ItemNotices
        why={one(query, 'why')}
        isKept={one(query, 'kept') !== undefined}
        isAttached={one(query, 'attached') !== undefined}
        isUnsaved={form.isUnsaved}
        theirs={form.theirs}
        mine={form.values}
        throwAway={throwAway}
        hidden={{ key: freshKey(), id, item }}
      />
      <ItemForm
        action={typed}
        submission={submission}
        id={id}
        item={item}
        version={form.version}
        state={draft.amendment.version}
        faults={form.faults}
        sections={sections}
        save={words(`amend.form.save.${read.list}`)}
      >
        {'fingerprint' in form.values ? <input type="hidden" name="fingerprint" value={textIn(form.values, 'fingerprint')} /> : null}
        {fields}
      </ItemForm>
      {read.list === 'text' ? <TextPreview>{drawn(textIn(form.values, 'text'))}</TextPreview> : null}
      {read.list === 'sources' ? <SeenPages id={id} item={item} form={form} query={query} /> : null}
    </DraftFrame>
  );
}

function drawn(text: string): ReactElement {
  const made = renderMarkdown(text);
  return made.ok ? made.value : <p>{words('amend.text.cannotDraw')}</p>;
}

type SeenProps = Asked & { readonly form: ReadForm };

function SeenPages({ id, item, form, query }: SeenProps): ReactElement {
  return (
    <PagesSeen
      submission={freshKey()}
      id={id}
      item={item}
      version={form.version}
      source={readItemKey(item)?.id ?? ''}
      back={itemPage(id, item)}
      has={textIn(form.values, 'fingerprint') !== ''}
      file={one(query, 'file') ?? null}
      refused={fileRefusalIn(one(query, 'refused'))}
      attach={attachPage}
    />
  );
}
