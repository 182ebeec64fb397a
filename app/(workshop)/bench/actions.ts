'use server';

import { redirect } from 'next/navigation';
import { askForRole } from '@/lib/accounts/ask-for-role';
import { keepAccount } from '@/lib/accounts/keep-account';
import { mailConfirmationAgain } from '@/lib/accounts/mail-confirmation-again';
import { keyInput, requestInput, roleAskInput } from '@/lib/accounts/schema';
import { withdrawRoleRequest } from '@/lib/accounts/withdraw-role-request';
import { makeActorCtx } from '@/lib/server/actor-ctx';
import { defineAction } from '@/lib/server/define-action';
import { keepAt, leadFrom } from '@/lib/server/lead-on';
import { refusalWords } from '@/app/(account)/refusal-words';

export const confirmAgain = defineAction({
  input: keyInput,
  context: makeActorCtx,
  work: mailConfirmationAgain,
  done: () => redirect('/bench?done=sent'),
  say: refusalWords,
  keep: keepAt('/bench'),
  lead: leadFrom('/bench'),
});

export const stay = defineAction({
  input: keyInput,
  context: makeActorCtx,
  work: keepAccount,
  done: () => redirect('/bench?done=kept'),
  say: refusalWords,
  keep: keepAt('/bench'),
  lead: leadFrom('/bench'),
});

export const ask = defineAction({
  input: roleAskInput,
  context: makeActorCtx,
  work: askForRole,
  done: () => redirect('/bench/ask?done=ask'),
  say: (refusal) => (refusal.kind === 'unknown-region' ? { regions: refusalWords(refusal)['region'] ?? '' } : refusalWords(refusal)),
  keep: keepAt('/bench/ask'),
  lead: leadFrom('/bench/ask'),
});

export const withdraw = defineAction({
  input: requestInput,
  context: makeActorCtx,
  work: withdrawRoleRequest,
  done: () => redirect('/bench/ask?done=withdrawn'),
  say: refusalWords,
  keep: keepAt('/bench/ask'),
  lead: leadFrom('/bench/ask'),
});
