'use server';

import { notFound, redirect } from 'next/navigation';
import { answerQuestion } from '@/lib/checks/answer-question';
import { beginCheck, type BeginRefusal } from '@/lib/checks/begin-check';
import { changePlaces } from '@/lib/checks/change-places';
import { keepCheckCopy } from '@/lib/checks/keep-check-copy';
import { answerInput, beginInput, checkId } from '@/lib/checks/schema';
import { showChecklist } from '@/lib/checks/show-checklist';
import { makeCtx } from '@/lib/server/ctx';
import { guardedForm } from '@/lib/server/define-action';
import { fieldsOf, placesOf } from './form-fields';

/** Whoever has the address of a check may read and change it; there is no other right to ask for here. */

export const begin = guardedForm(async (form) => {
  const input = beginInput.safeParse(placesOf(form));
  if (!input.success) redirect(`/check?${refusedPlaces(form, 'day')}`);
  const begun = await beginCheck(makeCtx(), input.data);
  if (!begun.ok) redirect(`/check?${refusedPlaces(form, whyOf(begun.error))}`);
  redirect(`/check/${begun.value.id}/use`);
});

export const place = guardedForm(async (form) => {
  const id = checkId.safeParse(form.get('key'));
  if (!id.success) notFound();
  const input = beginInput.safeParse(placesOf(form));
  if (!input.success) redirect(`/check/${id.data}/places?${refusedPlaces(form, 'day')}`);
  const changed = await changePlaces(makeCtx(), input.data);
  if (changed.ok) redirect(`/check/${id.data}/review`);
  if (changed.error.kind === 'not-found') notFound();
  redirect(`/check/${id.data}/places?${refusedPlaces(form, whyOf(changed.error))}`);
});

export const answer = guardedForm(async (form) => {
  const input = answerInput.safeParse(fieldsOf(form));
  if (!input.success) redirect('/broken?why=origin');
  const { id, question } = input.data;
  const answered = await answerQuestion(makeCtx(), input.data);
  if (!answered.ok && answered.error.kind === 'not-found') notFound();
  if (!answered.ok) redirect(`/check/${id}/${question}?look=1`);
  redirect(answered.value.next === null ? `/check/${id}/review` : `/check/${id}/${answered.value.next}`);
});

export const show = guardedForm(async (form) => {
  const id = checkId.safeParse(form.get('id'));
  if (!id.success) notFound();
  const shown = await showChecklist(makeCtx(), { id: id.data });
  if (!shown.ok) notFound();
  redirect(`/check/${id.data}`);
});

export const keepCopy = guardedForm(async (form) => {
  const id = checkId.safeParse(form.get('id'));
  if (!id.success) notFound();
  const kept = await keepCheckCopy(makeCtx(), { id: id.data });
  if (!kept.ok) notFound();
  redirect(`/copies/${kept.value.hash}`);
});

const whyOf = (refusal: BeginRefusal): string => (refusal.kind === 'no-region' ? 'none' : `unknown:${refusal.code}`);

/** What was chosen goes back in the address, so that a refused form keeps it without script. */
function refusedPlaces(form: FormData, why: string): string {
  const { regions, saleOn, fromNote } = placesOf(form);
  const back = new URLSearchParams({ why });
  for (const region of regions.slice(0, 40)) back.append('region', region.slice(0, 20));
  if (saleOn !== null) back.set('on', saleOn.slice(0, 20));
  if (fromNote !== null) back.set('with', fromNote.slice(0, 80));
  return back.toString();
}
