'use server';

import { redirect } from 'next/navigation';
import { renewRecoveryCodes } from '@/lib/accounts/renew-recovery-codes';
import { keyInput } from '@/lib/accounts/schema';
import { turnOffSecondFactor } from '@/lib/accounts/turn-off-second-factor';
import { makeActorCtx } from '@/lib/server/actor-ctx';
import { defineAction } from '@/lib/server/define-action';
import { keepForm } from '@/lib/server/kept-form';
import { keepAt, leadFrom } from '@/lib/server/lead-on';
import { withSession } from '@/lib/server/session';
import { refusalWords } from '@/app/(account)/refusal-words';

const HERE = '/bench/account/second-factor';

export const turnOff = defineAction({
  input: keyInput,
  context: makeActorCtx,
  work: (ctx, input) => withSession((session) => turnOffSecondFactor(ctx, input, session.id)),
  done: () => redirect('/bench/account?done=factorOff'),
  say: refusalWords,
  keep: keepAt(HERE),
  lead: leadFrom(HERE),
});

export const renewCodes = defineAction({
  input: keyInput,
  context: makeActorCtx,
  work: (ctx) => renewRecoveryCodes(ctx),
  done: async ({ codes }, { key }) => redirect(`${HERE}/codes?${await keepForm({ key, values: { codes }, errors: {}, tries: 0 })}`),
  say: refusalWords,
  keep: keepAt(HERE),
  lead: leadFrom(HERE),
});
