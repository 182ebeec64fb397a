import { z } from 'zod';
import { regionCode, slug } from '@/lib/kernel/shapes';
import { words } from '@/lib/kernel/words';
import { DOUBT_STATES, linksIn, MOST_LINKS, tidyWords } from './domain/doubt';

const key = z.uuid({ error: () => words('accounts.fault.form') });
const doubtId = z.uuid();

const WORDS_LEAST = 10;
const ELSEWHERE_MOST = 1000;
const LINK_MOST = 500;
const ASIDE_MOST = 500;
const ANSWER_MOST = 2000;

/** A text of several lines. Its length is looked at before anything is made of it. */
const longText = (least: number, most: number, empty: () => string) =>
  z
    .string({ error: empty })
    .max(most * 4, { error: () => words('doubts.fault.long', { most }) })
    .transform(tidyWords)
    .pipe(
      z
        .string()
        .min(least, { error: empty })
        .max(most, { error: () => words('doubts.fault.long', { most }) }),
    );

const optionalText = (most: number) =>
  longText(0, most, () => words('doubts.fault.form'))
    .transform((text) => (text === '' ? null : text))
    .optional()
    .transform((text) => text ?? null);

/** What a reader's form holds. `homepage` is a field that people do not see; `stamp` tells when the form was drawn. */
export const doubtInput = z
  .strictObject({
    key,
    rule: slug,
    words: longText(WORDS_LEAST, ANSWER_MOST, () => words('doubts.fault.words', { least: WORDS_LEAST })),
    elsewhere: optionalText(ELSEWHERE_MOST),
    link: optionalText(LINK_MOST),
    homepage: z
      .string()
      .max(0, { error: () => words('doubts.fault.trap') })
      .optional(),
    stamp: z.string({ error: () => words('doubts.fault.form') }).max(200, { error: () => words('doubts.fault.form') }),
  })
  .refine((input) => linksIn([input.words, input.elsewhere ?? '', input.link ?? '']) <= MOST_LINKS, {
    path: ['words'],
    error: () => words('doubts.fault.links', { most: MOST_LINKS }),
  })
  .transform(({ homepage: _, ...input }) => input);

export const answerDoubtInput = z.strictObject({
  key,
  id: doubtId,
  answer: longText(WORDS_LEAST, ANSWER_MOST, () => words('doubts.fault.answer', { least: WORDS_LEAST })),
});

export const setAsideInput = z.strictObject({
  key,
  id: doubtId,
  reason: longText(3, ASIDE_MOST, () => words('doubts.fault.reason')),
});

export const takeUpInput = z.strictObject({ key, id: doubtId });
export const keepSheetInput = z.strictObject({ key, region: regionCode });

const text = z.union([z.string(), z.array(z.string()).transform((all) => all[0] ?? '')]);

/** Of the desk's address: whatever cannot be read asks for nothing. */
export const doubtsQuery = z.object({
  region: text.pipe(regionCode).optional().catch(undefined),
  state: text.pipe(z.enum(DOUBT_STATES)).optional().catch(undefined),
  /** For the next page: the id of the last doubt of this one. */
  after: text.pipe(doubtId).optional().catch(undefined),
});

const WHOLE_NUMBER = /^\d{1,4}$/;

export const lookAgainQuery = z.object({
  region: text.pipe(regionCode).optional().catch(undefined),
  /** One's own sheets, those nobody keeps, or those of an account. */
  keeper: text
    .pipe(z.union([z.literal('me'), z.literal('nobody'), z.uuid()]))
    .optional()
    .catch(undefined),
  /** Due within so many days. */
  days: text
    .pipe(z.string().regex(WHOLE_NUMBER).transform(Number).pipe(z.int().max(3660)))
    .optional()
    .catch(undefined),
  page: text
    .pipe(z.string().regex(WHOLE_NUMBER).transform(Number).pipe(z.int().min(1)))
    .optional()
    .catch(undefined),
});

export { doubtId };

export type DoubtInput = z.output<typeof doubtInput>;
export type AnswerDoubtInput = z.output<typeof answerDoubtInput>;
export type SetAsideInput = z.output<typeof setAsideInput>;
export type TakeUpInput = z.output<typeof takeUpInput>;
export type KeepSheetInput = z.output<typeof keepSheetInput>;
export type DoubtsQuery = z.output<typeof doubtsQuery>;
export type LookAgainQuery = z.output<typeof lookAgainQuery>;
