'use server';

import { redirect } from 'next/navigation';
import { nextPlace } from '@/lib/accounts/domain/next-place';
import { giveSecondFactor } from '@/lib/accounts/give-second-factor';
import { mailLink } from '@/lib/accounts/mail-link';
import { resetPassword } from '@/lib/accounts/reset-password';
import { againInput, codeInput, mailInput, resetInput, signInInput, signUpInput, tokenInput } from '@/lib/accounts/schema';
import { signIn } from '@/lib/accounts/sign-in';
import { signInAgain } from '@/lib/accounts/sign-in-again';
import { signUp } from '@/lib/accounts/sign-up';
import { spendConfirmation } from '@/lib/accounts/spend-confirmation';
import { spendSignInLink } from '@/lib/accounts/spend-sign-in-link';
import { words } from '@/lib/kernel/words';
import { makeActorCtx } from '@/lib/server/actor-ctx';
import { defineAction, guardedForm } from '@/lib/server/define-action';
import { keepAt, leadFrom } from '@/lib/server/lead-on';
import { clientAgent, dropSession, wearSession, withSession } from '@/lib/server/session';
import { afterSignIn } from './after-sign-in';
import { refusalWords } from './refusal-words';

export const beginAccount = defineAction({
  input: signUpInput,
  context: makeActorCtx,
  work: signUp,
  done: () => redirect('/sign-up/sent'),
  say: refusalWords,
  keep: keepAt('/sign-up'),
  lead: leadFrom('/sign-up'),
});

/** A refused one is shown as the answer itself: nothing of it is kept but the address, in the form. */
export const enterByPassword = defineAction({
  input: signInInput,
  context: makeActorCtx,
  work: async (ctx, input) => signIn(ctx, input, await clientAgent()),
  done: async ({ sid, then }, { next }) => {
    await wearSession(sid);
    redirect(afterSignIn(then, next));
  },
  say: (refusal) => (refusal.kind === 'wrong' ? { password: words('accounts.fault.wrong') } : refusalWords(refusal)),
  lead: leadFrom('/sign-in'),
});

export const sendLink = defineAction({
  input: mailInput,
  context: makeActorCtx,
  work: (ctx, input) => mailLink(ctx, 'link', input),
  done: () => redirect('/sign-in/link/sent'),
  say: refusalWords,
  keep: keepAt('/sign-in/link'),
  lead: leadFrom('/sign-in/link'),
});

export const sendReset = defineAction({
  input: mailInput,
  context: makeActorCtx,
  work: (ctx, input) => mailLink(ctx, 'reset', input),
  done: () => redirect('/reset/sent'),
  say: refusalWords,
  keep: keepAt('/reset'),
  lead: leadFrom('/reset'),
});

export const choosePassword = defineAction({
  input: resetInput,
  context: makeActorCtx,
  work: resetPassword,
  done: () => redirect('/sign-in?done=reset'),
  say: (refusal) => (refusal.kind === 'link-over' ? { form: words('accounts.over.title') } : refusalWords(refusal)),
  lead: leadFrom('/reset'),
});

export const enterByLink = guardedForm(async (form) => {
  const input = tokenInput.safeParse({ key: form.get('key'), token: form.get('token') });
  if (!input.success) redirect('/sign-in/link/over');
  const spent = await spendSignInLink(await makeActorCtx(), input.data, await clientAgent());
  if (!spent.ok) redirect('/sign-in/link/over');
  await wearSession(spent.value.sid);
  redirect(afterSignIn(spent.value.then, undefined));
});

export const confirm = guardedForm(async (form) => {
  const input = tokenInput.safeParse({ key: form.get('key'), token: form.get('token') });
  if (!input.success) redirect('/confirm/over');
  const spent = await spendConfirmation(await makeActorCtx(), input.data);
  if (!spent.ok) redirect('/confirm/over');
  redirect(spent.value.what === 'account' ? '/sign-in?done=confirmed' : '/sign-in?done=address');
});

export const giveCode = defineAction({
  input: codeInput,
  context: makeActorCtx,
  work: (ctx, input) => withSession(async (session) => giveSecondFactor(ctx, input, session, await clientAgent())),
  done: async ({ sid }, { next }) => {
    await wearSession(sid);
    redirect(nextPlace(next, '/bench'));
  },
  say: refusalWords,
  lead: leadFrom('/sign-in/second-factor'),
});

export const typeAgain = defineAction({
  input: againInput,
  context: makeActorCtx,
  work: (ctx, input) => withSession((session) => signInAgain(ctx, input, session.id)),
  done: (_, { next }) => redirect(nextPlace(next, '/bench/account')),
  say: refusalWords,
  lead: leadFrom('/sign-in/again'),
});

export const signOut = guardedForm(async () => {
  await dropSession();
  redirect('/sign-in?done=out');
});
