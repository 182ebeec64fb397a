'use server';

import { redirect } from 'next/navigation';
import { answerDoubt } from '@/lib/regions/answer-doubt';
import { answerDoubtInput, setAsideInput, takeUpInput } from '@/lib/regions/doubt-schema';
import { setAsideDoubt } from '@/lib/regions/set-aside-doubt';
import { takeDoubtUp } from '@/lib/regions/take-doubt-up';
import { makeActorCtx } from '@/lib/server/actor-ctx';
import { defineAction, type FormState } from '@/lib/server/define-action';
import { keepAt, leadFrom } from '@/lib/server/lead-on';
import { deskRefusalWords } from './refusal-words';

/** The page of the doubt named in the form, which anybody may have written. */
const pageOf = ({ values }: FormState): string => `/doubts/${encodeURIComponent(String(values['id'] ?? ''))}`;

const ways = {
  say: deskRefusalWords,
  keep: (state: FormState) => keepAt(pageOf(state))(state),
  lead: (refusal: { readonly kind: string }, state: FormState) => leadFrom(pageOf(state))(refusal, state),
};

export const answer = defineAction({
  input: answerDoubtInput,
  context: makeActorCtx,
  work: answerDoubt,
  done: (_, { id }) => redirect(`/doubts?done=answered&of=${id}`),
  ...ways,
});

export const setAside = defineAction({
  input: setAsideInput,
  context: makeActorCtx,
  work: setAsideDoubt,
  done: (_, { id }) => redirect(`/doubts?done=set-aside&of=${id}`),
  ...ways,
});

export const takeUp = defineAction({
  input: takeUpInput,
  context: makeActorCtx,
  work: takeDoubtUp,
  done: (_, { id }) => redirect(`/doubts?done=taken-up&of=${id}`),
  ...ways,
});
