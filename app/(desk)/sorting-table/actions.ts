'use server';

import { redirect } from 'next/navigation';
import { claimAnchor } from '@/components/review/anchors';
import type { TickState } from '@/components/review/tick';
import { addRemark } from '@/lib/regions/add-remark';
import {
  decisionInput,
  remarkAnswerInput,
  remarkDoneInput,
  remarkInput,
  tickInput,
  versionedInput,
  type RemarkAnswerInput,
} from '@/lib/regions/amendment-schema';
import { answerRemark } from '@/lib/regions/answer-remark';
import { approveAmendment } from '@/lib/regions/approve-amendment';
import { holdAmendment } from '@/lib/regions/hold-amendment';
import { markRemark } from '@/lib/regions/mark-remark';
import { releaseAmendment } from '@/lib/regions/release-amendment';
import { sendBackAmendment } from '@/lib/regions/send-back-amendment';
import { tickClaim } from '@/lib/regions/tick-claim';
import { makeActorCtx, type ActorCtx } from '@/lib/server/actor-ctx';
import { defineAction, freshForm, guarded, guardedForm, isScripted } from '@/lib/server/define-action';
import { enter, leadFrom } from '@/lib/server/lead-on';
import { atPage, textIn } from './at-page';
import { atLine, decidedAt, pageOf } from './find-review';
import { refusalWords, sayRefusal } from './refusal-words';

const TABLE = '/sorting-table';

export const tick = guarded<TickState>(async (_, form) => {
  const [id, claim, isRead] = [textIn(form, 'id'), textIn(form, 'claim'), textIn(form, 'read') === 'yes'];
  const input = tickInput.safeParse({ key: textIn(form, 'key'), id, version: textIn(form, 'version'), claim, read: isRead });
  if (!input.success) redirect(TABLE);
  const kept = await tickClaim(await makeActorCtx(), input.data);
  const door = kept.ok ? null : await leadFrom(pageOf(id))(kept.error, freshForm());
  if (door !== null) redirect(door);
  if (!(await isScripted())) redirect(`${pageOf(id)}${kept.ok ? '' : '?why=tick'}#${claimAnchor(claim)}`);
  return { key: freshForm().key, isRead: kept.ok ? isRead : !isRead, fault: kept.ok ? null : sayRefusal(kept.error) };
});

export const remark = defineAction({
  input: remarkInput,
  context: makeActorCtx,
  work: addRemark,
  done: (_, { id, line }) => redirect(atLine(id, line)),
  say: (refusal) => ({ words: sayRefusal(refusal) }),
  ...atPage(),
});

export const answer = defineAction({
  input: remarkAnswerInput.extend({ line: remarkInput.shape.line }),
  context: makeActorCtx,
  work: (ctx: ActorCtx, { key, id, remark: to, words }: RemarkAnswerInput) => answerRemark(ctx, { key, id, remark: to, words }),
  done: (_, { id, line }) => redirect(atLine(id, line)),
  say: (refusal) => ({ words: sayRefusal(refusal) }),
  ...atPage(),
});

export const mark = guardedForm(async (form) => {
  const [id, line] = [textIn(form, 'id'), textIn(form, 'line')];
  const { ctx } = await enter('amendment.judge', pageOf(id));
  const given = { key: textIn(form, 'key'), id, remark: textIn(form, 'remark'), answered: textIn(form, 'answered') === 'yes' };
  const input = remarkDoneInput.safeParse(given);
  if (!input.success) redirect(TABLE);
  const marked = await markRemark(ctx, input.data);
  redirect(marked.ok ? atLine(id, line) : `${pageOf(id)}?why=mark`);
});

export const hold = defineAction({
  input: decisionInput,
  context: makeActorCtx,
  work: holdAmendment,
  done: (_, { id }) => redirect(`${TABLE}?done=held&of=${id}`),
  say: refusalWords,
  ...atPage('hold'),
});

export const release = defineAction({
  input: versionedInput,
  context: makeActorCtx,
  work: releaseAmendment,
  done: (_, { id }) => redirect(`${TABLE}?done=released&of=${id}`),
  say: refusalWords,
  ...atPage(),
});

export const sendBack = defineAction({
  input: decisionInput,
  context: makeActorCtx,
  work: sendBackAmendment,
  done: (_, { id }) => redirect(`${TABLE}?done=sent-back&of=${id}`),
  say: refusalWords,
  ...atPage('send-back'),
});

export const approve = defineAction({
  input: versionedInput,
  context: makeActorCtx,
  work: approveAmendment,
  done: (approved, { id }) => redirect(decidedAt(approved, id)),
  say: refusalWords,
  ...atPage('approve'),
});

/** An approval of what the sheet has moved on from ends with its author: it never buries what came into use since. */
export const giveBack = defineAction({
  input: versionedInput,
  context: makeActorCtx,
  work: approveAmendment,
  done: (approved, { id }) => redirect(decidedAt(approved, id)),
  say: refusalWords,
  ...atPage(),
});
