import { z } from 'zod';

export const MAIL_STATES = ['waiting', 'sending', 'sent', 'bounced', 'parked'] as const;
export type MailState = (typeof MAIL_STATES)[number];

/** A mail as the worker sends it. */
export type MailToSend = {
  readonly id: string;
  readonly kind: string;
  readonly address: string;
  readonly subject: string;
  readonly text: string;
  readonly html: string;
  readonly leaveUrl: string | null;
  readonly messageId: string;
  /** This one included. */
  readonly tries: number;
};

export const mailToSendRow = z
  .object({
    id: z.string(),
    kind: z.string(),
    address: z.string(),
    subject: z.string(),
    body_text: z.string(),
    body_html: z.string(),
    leave_url: z.string().nullable(),
    message_id: z.string(),
    tries: z.number(),
  })
  .transform(({ body_text, body_html, leave_url, message_id, ...row }): MailToSend => ({
    ...row,
    text: body_text,
    html: body_html,
    leaveUrl: leave_url,
    messageId: message_id,
  }));

/** A mail as the outbox page tells of it: never its text. */
export type ListedMail = {
  readonly id: string;
  readonly kind: string;
  readonly accountId: string | null;
  readonly address: string;
  readonly state: MailState;
  readonly tries: number;
  readonly lastAnswer: string | null;
  readonly madeAt: Date;
  readonly dueAt: Date;
  readonly endedAt: Date | null;
};

export const listedMailRow = z
  .object({
    id: z.string(),
    kind: z.string(),
    account_id: z.string().nullable(),
    address: z.string(),
    state: z.enum(MAIL_STATES),
    tries: z.number(),
    last_answer: z.string().nullable(),
    made_at: z.date(),
    due_at: z.date(),
    ended_at: z.date().nullable(),
  })
  .transform(({ account_id, last_answer, made_at, due_at, ended_at, ...row }): ListedMail => ({
    ...row,
    accountId: account_id,
    lastAnswer: last_answer,
    madeAt: made_at,
    dueAt: due_at,
    endedAt: ended_at,
  }));
