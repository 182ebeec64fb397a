'use server';

import { redirect } from 'next/navigation';
import { makeCtx } from '@/lib/server/ctx';
import { guardedForm } from '@/lib/server/define-action';
import { keepEntry } from '@/lib/readings/keep-entry';
import { sheetInput } from '@/lib/readings/sheet-schema';
import { sheetOf } from './form-fields';

/**
 * Keeps what was typed and leads to its address, whatever it says: there it is read, and held against limits or shown again with
 * what to mend. Anyone may keep an entry; whoever has its address may read it.
 */
export const keepReadings = guardedForm(async (form) => {
  const input = sheetInput.safeParse(sheetOf(form));
  if (!input.success) redirect('/broken?why=origin');
  const kept = await keepEntry(makeCtx(), input.data);
  if (!kept.ok) redirect('/broken');
  redirect(`/readings/${kept.value.id}${placeOf(form.get('act'))}`);
});

/** Where on the page the act that was pressed shows its answer. */
function placeOf(act: unknown): string {
  if (act === 'draw') return '#drawn';
  if (act === 'preview') return '#part-rows';
  if (act === 'more-further') return '#further-caption';
  return act === 'more-readings' ? '#readings-caption' : '';
}
