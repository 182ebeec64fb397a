'use server';

import { redirect } from 'next/navigation';
import { doubtInput } from '@/lib/regions/doubt-schema';
import { raiseDoubt } from '@/lib/regions/raise-doubt';
import { makeActorCtx } from '@/lib/server/actor-ctx';
import { defineAction, type FormState } from '@/lib/server/define-action';
import { keepAt, leadFrom } from '@/lib/server/lead-on';
import { doubtRefusalWords } from './doubt-words';

/** The page of the form, by the rule named in it, which anybody may have written. */
const pageOf = ({ values }: FormState): string => `/rules/${encodeURIComponent(String(values['rule'] ?? ''))}/doubt`;

/** Anyone may doubt a rule; nothing is kept that tells who did. */
export const raise = defineAction({
  input: doubtInput,
  context: makeActorCtx,
  work: raiseDoubt,
  done: (_, { rule }) => redirect(`/rules/${rule}/doubt/sent`),
  say: doubtRefusalWords,
  keep: (state) => keepAt(pageOf(state))(state),
  lead: async (refusal, state) => {
    // The form needs a new stamp, and the reader the rule as it stands by now: the page is drawn anew.
    if (refusal.kind === 'too-old') return keepAt(pageOf(state))({ ...state, errors: doubtRefusalWords(refusal) });
    return leadFrom(pageOf(state))(refusal, state);
  },
});
