'use server';

import { cookies, headers } from 'next/headers';
import { redirect } from 'next/navigation';
import { isTheme } from '@/components/site/theme-choice';
import { guardedForm, isScripted } from '@/lib/server/define-action';
import { ownOrigin, samePlace } from '@/lib/server/own-site';

const YEAR = 365 * 86_400;

/** Keeps the choice of colours in a cookie. A script draws the page anew where it is, and the focus stays on the button. */
export const chooseTheme = guardedForm(async (form) => {
  const theme = form.get('theme');
  const kept = isTheme(theme) && theme !== 'system' ? { value: theme, maxAge: YEAR } : { value: '', maxAge: 0 };
  (await cookies()).set({ name: 'theme', ...kept, path: '/', httpOnly: true, sameSite: 'lax', secure: ownOrigin().startsWith('https:') });
  if (!(await isScripted())) redirect(samePlace((await headers()).get('referer')));
});
