import { z } from 'zod';
import { calendarDate, regionCode } from '@/lib/kernel/shapes';
import type { DatedCopy } from './domain/dated-copy';
import type { Answers } from './domain/knowledge';
import { readNoteAnswer } from './domain/note-answer';
import { QUESTIONS, type Question } from './domain/questions';
import type { CheckId, CopyHash } from './domain/ids';

/** Above any pot and any yearly count; below where doubles lose whole units. */
const MOST = 1_000_000_000_000;

const money = z.strictObject({
  amount: z.string().regex(/^\d{1,12}(\.\d{1,6})?$/, 'Give an amount as digits in quotation marks, such as "120.00"'),
  currency: z.string().regex(/^[A-Z]{3}$/, 'Give a currency as three capital letters, such as "EUR"'),
});

const onePerCurrency = z
  .array(money)
  .min(1)
  .max(20)
  .refine((list) => new Set(list.map(({ currency }) => currency)).size === list.length, { error: 'Give one amount for each currency' });

const several = (options: readonly string[]) =>
  z
    .array(z.enum([...options, 'none'], { error: `Choose from: ${options.join(', ')}; [] or ["none"] when none applies` }))
    .max(options.length)
    .refine((list) => new Set(list).size === list.length, { error: 'Name each option once' })
    .refine((list) => !list.includes('none') || list.length === 1, { error: '"none" stands alone' });

function answerSchema(question: Question): z.ZodType {
  switch (question.kind) {
    case 'yesno':
      return z.boolean({ error: 'Answer true or false; leave it out, or list it in "declined", when it is not known' });
    case 'choice':
      return z.enum([...question.options], { error: `Choose one of: ${question.options.join(', ')}` });
    case 'several':
      return several(question.options);
    case 'amount':
      return z
        .number({ error: `Give a number (${question.unit}), without quotation marks` })
        .min(0, 'Give zero or more')
        .max(MOST, 'That is more than any pot or workshop has; check the number');
    case 'money':
      return z.union([money, onePerCurrency], { error: 'Give {"amount":"120.00","currency":"EUR"}' });
    case 'region':
      return regionCode;
  }
}

const LIST: readonly Question[] = QUESTIONS;
const shape = Object.fromEntries(LIST.map((question) => [question.id, answerSchema(question).optional()]));
const ids = LIST.map(({ id }) => id);

/** Answers about one piece, each of its question's kind; unknown questions are refused. */
export const answersInput = z.strictObject(shape).transform((given) => given as Answers);

export const declinedInput = z
  .array(z.enum(ids, { error: 'There is no question of this id' }))
  .max(ids.length)
  .refine((list) => new Set(list).size === list.length, { error: 'Name each question once' });

/** The body of `POST /api/v1/checks`. */
export const checkInput = z
  .strictObject({
    regions: z
      .array(regionCode)
      .min(1, 'Name at least one region, such as "dk"')
      .max(30, 'Name at most 30 regions at a time')
      .refine((list) => new Set(list).size === list.length, { error: 'Name each region once' }),
    on: calendarDate.optional(),
    answers: answersInput.default({}),
    declined: declinedInput.default([]),
    keep: z.boolean().default(false),
  })
  .superRefine(({ answers, declined }, ctx) => {
    declined.forEach((id, place) => {
      if (!Object.hasOwn(answers, id)) return;
      ctx.addIssue({ code: 'custom', path: ['declined', place], message: 'This question is answered and declined; keep one of the two' });
    });
  });
export type CheckInput = z.output<typeof checkInput>;

export const checkId = z
  .string()
  .regex(/^[A-Za-z0-9_-]{22}$/)
  .transform((id) => id as CheckId);

/** Fields of a page of questions. Bounded: a form of ours never sends more. */
const fields = z
  .record(z.string().max(80), z.array(z.string().max(200)).max(40))
  .refine((all) => Object.keys(all).length <= 60, { error: 'That is more than a page of ours sends' });

const saleOn = z.union([z.literal('').transform(() => null), calendarDate]).nullable();

/** The answer of a note, as an address or a form carries it: "crazed:yes". What is no such answer is null, and fills in nothing. */
export const noteAnswer = z
  .string()
  .max(80)
  .transform(readNoteAnswer)
  .nullish()
  .transform((answer) => answer ?? null)
  .catch(null);

/** The form that begins a check, or that changes the places and the day of one. */
export const beginInput = z.object({ key: checkId, regions: z.array(regionCode).max(12), saleOn, fromNote: noteAnswer });
export type BeginInput = z.output<typeof beginInput>;

/** One page of questions as sent. */
export const answerInput = z.object({
  id: checkId,
  question: z.enum(ids),
  asked: z.array(z.enum(ids)).min(1).max(6),
  fields,
});
export type AnswerInput = z.output<typeof answerInput>;

export const copyHash = z
  .string()
  .regex(/^[0-9a-f]{64}$/)
  .transform((hash) => hash as CopyHash);

/** A dated copy out of its text. The reader has compared the text with its fingerprint before, so its shape is what we wrote. */
export const copyDocument = z.looseObject({ semantics: z.number() }).transform((document) => document as unknown as DatedCopy);
