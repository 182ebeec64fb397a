'use server';

import { redirect } from 'next/navigation';
import { regionCode } from '@/lib/regions/schema';
import { wishForRegion } from '@/lib/regions/wish-for-region';
import { clientAddress } from '@/lib/server/client-address';
import { makeCtx } from '@/lib/server/ctx';
import { guardedForm } from '@/lib/server/define-action';

/** Anyone may ask for a region; nothing is kept that tells who did. */
export const wish = guardedForm(async (form) => {
  const region = regionCode.safeParse(form.get('region'));
  if (!region.success) redirect('/regions/wishes?why=no-such-country');
  const wished = await wishForRegion({ ...makeCtx(), from: await clientAddress() }, { region: region.data });
  if (wished.ok) redirect(`/regions/wishes?asked=${region.data}`);
  if (wished.error.kind === 'has-sheet') redirect(`/regions/${region.data}`);
  redirect(`/regions/wishes?why=${wished.error.kind}&asked=${region.data}`);
});
