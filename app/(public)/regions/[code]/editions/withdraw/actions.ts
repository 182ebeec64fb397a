'use server';

import { redirect } from 'next/navigation';
import { withdrawEditionInput } from '@/lib/regions/amendment-schema';
import { withdrawEdition } from '@/lib/regions/withdraw-edition';
import { makeActorCtx } from '@/lib/server/actor-ctx';
import { defineAction, type FormState } from '@/lib/server/define-action';
import { keepAt, leadFrom } from '@/lib/server/lead-on';
import { refusalWords } from './refusal-words';

const pageOf = ({ values }: FormState): string => `/regions/${encodeURIComponent(String(values['region'] ?? ''))}/editions/withdraw`;

export const withdraw = defineAction({
  input: withdrawEditionInput,
  context: makeActorCtx,
  work: withdrawEdition,
  done: ({ edition }, { region }) => redirect(`/regions/${region}/editions?done=${String(edition)}`),
  say: refusalWords,
  keep: (state) => keepAt(pageOf(state))(state),
  lead: (refusal, state) => leadFrom(pageOf(state))(refusal, state),
});
