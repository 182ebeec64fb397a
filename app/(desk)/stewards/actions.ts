'use server';

import { redirect } from 'next/navigation';
import { answerRequest } from '@/lib/accounts/answer-request';
import { changeRole } from '@/lib/accounts/change-role';
import { closeAccount } from '@/lib/accounts/close-account';
import { reopenAccount } from '@/lib/accounts/reopen-account';
import { answerInput, closingInput, roleChangeInput } from '@/lib/accounts/steward-schema';
import { retryParked } from '@/lib/notices/retry-parked';
import { retryInput } from '@/lib/notices/schema';
import { makeActorCtx } from '@/lib/server/actor-ctx';
import { defineAction, guardedForm } from '@/lib/server/define-action';
import { enter } from '@/lib/server/lead-on';
import { atPage } from './at-page';
import { refusalWords } from './refusal-words';

export const giveRole = defineAction({
  input: roleChangeInput,
  context: makeActorCtx,
  work: changeRole,
  done: (_, { id }) => redirect(`/stewards/accounts/${id}?done=role`),
  say: refusalWords,
  ...atPage((id) => `/stewards/accounts/${id}/role`),
});

export const close = defineAction({
  input: closingInput,
  context: makeActorCtx,
  work: closeAccount,
  done: (_, { id }) => redirect(`/stewards/accounts/${id}?done=closed`),
  say: refusalWords,
  ...atPage((id) => `/stewards/accounts/${id}/close`),
});

export const reopen = defineAction({
  input: closingInput,
  context: makeActorCtx,
  work: reopenAccount,
  done: (_, { id }) => redirect(`/stewards/accounts/${id}?done=opened`),
  say: refusalWords,
  ...atPage((id) => `/stewards/accounts/${id}/close`),
});

export const answer = defineAction({
  input: answerInput,
  context: makeActorCtx,
  work: answerRequest,
  done: () => redirect('/stewards/requests?done=answered'),
  say: refusalWords,
  ...atPage((id) => `/stewards/requests/${id}`),
});

export const retry = guardedForm(async (form) => {
  const { ctx } = await enter('outbox.retry', '/stewards/outbox?part=parked');
  const input = retryInput.safeParse({ key: form.get('key'), what: form.get('what'), id: form.get('id') });
  if (!input.success) redirect('/stewards/outbox?part=parked');
  const retried = await retryParked(ctx, input.data);
  redirect(`/stewards/outbox?part=parked&${retried.ok ? 'done=retried' : 'why=not-parked'}`);
});
