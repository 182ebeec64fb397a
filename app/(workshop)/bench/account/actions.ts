'use server';

import { redirect } from 'next/navigation';
import { askAddressChange } from '@/lib/accounts/ask-address-change';
import { beginExport } from '@/lib/accounts/begin-export';
import { changePassword } from '@/lib/accounts/change-password';
import { endOtherSessions } from '@/lib/accounts/end-other-sessions';
import { endOwnSession } from '@/lib/accounts/end-own-session';
import { leaveAccount } from '@/lib/accounts/leave-account';
import { renameAccount } from '@/lib/accounts/rename-account';
import { addressInput, factorInput, keyInput, passwordInput, preferencesInput, renameInput, sessionInput } from '@/lib/accounts/schema';
import { setOwnPreferences } from '@/lib/accounts/set-own-preferences';
import { turnOnSecondFactor } from '@/lib/accounts/turn-on-second-factor';
import { words } from '@/lib/kernel/words';
import { makeActorCtx } from '@/lib/server/actor-ctx';
import { defineAction } from '@/lib/server/define-action';
import { keepForm } from '@/lib/server/kept-form';
import { keepAt, leadFrom } from '@/lib/server/lead-on';
import { clientAgent, dropSession, withSession, wearSession } from '@/lib/server/session';
import { refusalWords } from '@/app/(account)/refusal-words';

const HOME = '/bench/account';

export const rename = defineAction({
  input: renameInput,
  context: makeActorCtx,
  work: renameAccount,
  done: () => redirect(`${HOME}?done=name`),
  say: refusalWords,
  keep: keepAt(`${HOME}/name`),
  lead: leadFrom(`${HOME}/name`),
});

export const changeAddress = defineAction({
  input: addressInput,
  context: makeActorCtx,
  work: askAddressChange,
  done: () => redirect(`${HOME}?done=address`),
  say: refusalWords,
  keep: keepAt(`${HOME}/address`),
  lead: leadFrom(`${HOME}/address`),
});

export const renewPassword = defineAction({
  input: passwordInput,
  context: makeActorCtx,
  work: (ctx, input) => withSession(async (session) => changePassword(ctx, input, session, await clientAgent())),
  done: async ({ sid }) => {
    await wearSession(sid);
    redirect(`${HOME}?done=password`);
  },
  say: (refusal) => (refusal.kind === 'wrong' ? { current: words('accounts.fault.current') } : refusalWords(refusal)),
  keep: keepAt(`${HOME}/password`),
  lead: leadFrom(`${HOME}/password`),
});

export const keepPreferences = defineAction({
  input: preferencesInput,
  context: makeActorCtx,
  work: setOwnPreferences,
  done: () => redirect(`${HOME}?done=preferences`),
  say: refusalWords,
  keep: keepAt(`${HOME}/preferences`),
  lead: leadFrom(`${HOME}/preferences`),
});

export const turnOn = defineAction({
  input: factorInput,
  context: makeActorCtx,
  work: (ctx, input) => withSession(async (session) => turnOnSecondFactor(ctx, input, session, await clientAgent())),
  done: async ({ sid, codes }, { key }) => {
    await wearSession(sid);
    redirect(`${HOME}/second-factor/codes?${await keepForm({ key, values: { codes }, errors: {}, tries: 0 })}`);
  },
  say: refusalWords,
  keep: keepAt(`${HOME}/second-factor`),
  lead: leadFrom(`${HOME}/second-factor`),
});

export const endSession = defineAction({
  input: sessionInput,
  context: makeActorCtx,
  work: endOwnSession,
  done: () => redirect(`${HOME}/sessions?done=session`),
  say: refusalWords,
  keep: keepAt(`${HOME}/sessions`),
  lead: leadFrom(`${HOME}/sessions`),
});

export const endOthers = defineAction({
  input: keyInput,
  context: makeActorCtx,
  work: (ctx) => withSession((session) => endOtherSessions(ctx, session.id)),
  done: () => redirect(`${HOME}/sessions?done=others`),
  say: refusalWords,
  keep: keepAt(`${HOME}/sessions`),
  lead: leadFrom(`${HOME}/sessions`),
});

export const putTogether = defineAction({
  input: keyInput,
  context: makeActorCtx,
  work: beginExport,
  done: () => redirect(`${HOME}/export`),
  say: refusalWords,
  keep: keepAt(`${HOME}/export`),
  lead: leadFrom(`${HOME}/export`),
});

export const leave = defineAction({
  input: keyInput,
  context: makeActorCtx,
  work: leaveAccount,
  done: async () => {
    await dropSession();
    redirect('/sign-in?done=leaving');
  },
  say: refusalWords,
  keep: keepAt(`${HOME}/delete`),
  lead: leadFrom(`${HOME}/delete`),
});
