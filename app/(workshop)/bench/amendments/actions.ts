'use server';

import { notFound, redirect } from 'next/navigation';
import { answerRemark } from '@/lib/regions/answer-remark';
import { beginAmendment } from '@/lib/regions/begin-amendment';
import { beginPlace } from '@/lib/regions/begin-place';
import { beginInput, newPlaceInput, remarkAnswerInput, saveItemInput } from '@/lib/regions/amendment-schema';
import { isItemKey } from '@/lib/regions/domain/sheet-items';
import { dropEntry } from '@/lib/regions/drop-entry';
import { dropItem } from '@/lib/regions/drop-item';
import { reopenAmendment } from '@/lib/regions/reopen-amendment';
import { restoreItem } from '@/lib/regions/restore-item';
import { sendAmendment } from '@/lib/regions/send-amendment';
import { attachForm, sendForm } from '@/lib/regions/send-form';
import { takeBackAmendment } from '@/lib/regions/take-back-amendment';
import { withdrawAmendment } from '@/lib/regions/withdraw-amendment';
import { makeActorCtx } from '@/lib/server/actor-ctx';
import { defineAction, guardedForm } from '@/lib/server/define-action';
import { enter, keepAt, leadFrom } from '@/lib/server/lead-on';
import { atPage } from '@/app/(desk)/stewards/at-page';
import { addPart } from './add-part';
import { attachFile } from './attach-file';
import { carryChosen } from './carry-chosen';
import { sentEntry } from './entry-form';
import { draftPage, itemPage } from './item-address';
import { keepTyped, saveTyped, whereUnread } from './keep-typed';
import { pressAmendment, pressItem } from './press-amendment';
import { refusalWords } from './refusal-words';

/** The form of one item: saved, or kept with a part added or taken out, as the pressed button says. */
export const typed = guardedForm(async (form) => {
  const sent = sentEntry(form);
  const input = saveItemInput.safeParse({ key: sent.key, id: sent.id, item: sent.item, version: sent.version, values: sent.values });
  if (!input.success) redirect(await whereUnread(sent));
  const ctx = await makeActorCtx();
  redirect(sent.do === '' || sent.do === 'save' ? await saveTyped(ctx, input.data) : await keepTyped(ctx, input.data, sent.do));
});

export const begin = guardedForm(async (form) => {
  const input = beginInput.safeParse({ key: form.get('key'), region: form.get('region') });
  if (!input.success) notFound();
  const { ctx } = await enter('amendment.write', `/regions/${input.data.region}/amend`);
  const begun = await beginAmendment(ctx, input.data);
  if (!begun.ok) redirect(`/regions/${input.data.region}/amend?why=${begun.error.kind}`);
  const item = form.get('item');
  redirect(typeof item === 'string' && isItemKey(item) ? itemPage(begun.value.id, item) : draftPage(begun.value.id));
});

export const beginNewPlace = defineAction({
  input: newPlaceInput,
  context: makeActorCtx,
  work: beginPlace,
  done: ({ id }) => redirect(draftPage(id)),
  say: refusalWords,
  keep: keepAt('/regions/new'),
  lead: leadFrom('/regions/new'),
});

/** Begins the form of something new: its id is made from its name. */
export const add = guardedForm(async (form) => {
  const id = form.get('id');
  const { ctx } = await enter('amendment.write', typeof id === 'string' ? draftPage(id) : '/bench/amendments');
  redirect(await addPart(ctx, form));
});

export const drop = guardedForm((form) => pressItem(form, { work: dropItem, done: 'dropped' }));
export const restore = guardedForm((form) => pressItem(form, { work: restoreItem, done: 'restored' }));
export const throwAway = guardedForm((form) => pressItem(form, { work: dropEntry, done: 'thrown-away' }));
export const takeBack = guardedForm((form) => pressAmendment(form, { work: takeBackAmendment, done: 'taken-back' }));
export const withdraw = guardedForm((form) => pressAmendment(form, { work: withdrawAmendment, done: 'withdrawn' }));
export const reopen = guardedForm((form) => pressAmendment(form, { work: reopenAmendment, done: 'reopened' }));

/** Carries the amendment over to the edition in use, with what was chosen where both sides changed the same. */
export const carry = guardedForm((form) =>
  pressAmendment(form, { work: (ctx, given) => carryChosen(ctx, given, form), done: 'carried-over' }),
);

/** A page as it was seen, put with the source whose form it belongs to. */
export const attachPage = guardedForm(async (form) => {
  const input = attachForm.safeParse(Object.fromEntries(form));
  if (!input.success) redirect('/bench/amendments?why=form');
  const { ctx } = await enter('amendment.write', draftPage(input.data.id));
  redirect(await attachFile(ctx, input.data));
});

export const send = defineAction({
  input: sendForm,
  context: makeActorCtx,
  work: sendAmendment,
  done: (_, { id }) => redirect(`${draftPage(id)}?done=sent`),
  say: refusalWords,
  ...atPage((id) => `/bench/amendments/${id}/check`),
});

export const answer = defineAction({
  input: remarkAnswerInput,
  context: makeActorCtx,
  work: answerRemark,
  done: (_, { id }) => redirect(`${draftPage(id)}?done=answered`),
  say: refusalWords,
  ...atPage((id) => `/bench/amendments/${id}`),
});
