'use server';

import { redirect } from 'next/navigation';
import { becomeKeeper } from '@/lib/regions/become-keeper';
import { keepSheetInput } from '@/lib/regions/doubt-schema';
import { stopKeeping } from '@/lib/regions/stop-keeping';
import { guardedForm } from '@/lib/server/define-action';
import { enter } from '@/lib/server/lead-on';

/** The page the press came from, and what it says there. */
function leadBack(form: FormData, region: string, said: string): never {
  if (form.get('back') === 'sheet') redirect(`/regions/${region}?${said}`);
  redirect(`/look-again?region=${region}&${said}`);
}

export const become = guardedForm(async (form) => {
  const { ctx } = await enter('sheet.keep', '/look-again');
  const input = keepSheetInput.safeParse({ key: form.get('key'), region: form.get('region') });
  if (!input.success) redirect('/look-again?why=refused');
  const kept = await becomeKeeper(ctx, input.data);
  leadBack(form, input.data.region, kept.ok ? 'done=took' : 'why=refused');
});

export const stop = guardedForm(async (form) => {
  const { ctx } = await enter('sheet.keep', '/look-again');
  const input = keepSheetInput.safeParse({ key: form.get('key'), region: form.get('region') });
  if (!input.success) redirect('/look-again?why=refused');
  const stopped = await stopKeeping(ctx, input.data);
  leadBack(form, input.data.region, stopped.ok ? 'done=gave' : 'why=refused');
});
