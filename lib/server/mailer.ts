import 'server-only';
import { createTransport, type Transporter } from 'nodemailer';
import type SMTPTransport from 'nodemailer/lib/smtp-transport';
import { z } from 'zod';
import type { MailToSend } from '@/db/rows/mail-row';
import type { Handover } from '@/lib/notices/domain/delivery';

/** Hands mails over to a server. Never throws for what the server says or does. */
export type Mailer = {
  readonly send: (mail: MailToSend) => Promise<Handover>;
  readonly close: () => void;
};

export type MailSettings = { readonly url: string; readonly from: string };

/** Each wait of the conversation, and the whole of it: a server that answers a letter at a time holds nobody for longer. */
const WAIT_MS = 10_000;
const WHOLE_MS = 30_000;
const LOOPBACK = ['localhost', '127.0.0.1', '[::1]'];

/** One recipient, and nothing a header or a list of addresses could be made of. */
const oneAddress = z.email().max(254);

type Transport = Transporter<SMTPTransport.SentMessageInfo>;

/** The domain that Message-IDs are made in. */
export const domainOf = (address: string): string => address.slice(address.lastIndexOf('@') + 1);

/** A mailer for the server in the settings. Every mail has a conversation of its own. */
export function makeMailer({ url, from }: MailSettings): Mailer {
  const transport = createTransport(optionsOf(url, from));
  return {
    async send(mail) {
      if (!oneAddress.safeParse(mail.address).success) return { kind: 'refused', answer: 'This is not one e-mail address' };
      try {
        const info = await inTime(transport.sendMail(messageOf(mail, from)));
        return { kind: 'taken', answer: info.response };
      } catch (error) {
        return handoverOf(error, transport);
      }
    },
    close() {
      transport.close();
    },
  };
}

function optionsOf(url: string, from: string): SMTPTransport.Options {
  const { protocol, hostname, port, username, password } = new URL(url);
  const secure = protocol === 'smtps:';
  const known = username !== '';
  return {
    host: hostname.replace(/^\[|\]$/g, ''),
    port: port === '' ? (secure ? 465 : 587) : Number(port),
    secure,
    // A password goes over the net in the clear to no other machine.
    requireTLS: known && !secure && !LOOPBACK.includes(hostname),
    ...(known ? { auth: { user: decodeURIComponent(username), pass: decodeURIComponent(password) } } : {}),
    name: domainOf(from),
    connectionTimeout: WAIT_MS,
    greetingTimeout: WAIT_MS,
    socketTimeout: WAIT_MS,
    dnsTimeout: WAIT_MS,
    disableFileAccess: true,
    disableUrlAccess: true,
  };
}

function messageOf(mail: MailToSend, from: string): SMTPTransport.MailOptions {
  const leave =
    mail.leaveUrl === null ? {} : { 'List-Unsubscribe': `<${mail.leaveUrl}>`, 'List-Unsubscribe-Post': 'List-Unsubscribe=One-Click' };
  return {
    envelope: { from, to: [mail.address] },
    from: { name: 'Footring', address: from },
    // An object, not a text: nothing in it is parsed into a second address.
    to: { name: '', address: mail.address },
    subject: mail.subject.replace(/[\p{Cc}\u2028\u2029]+/gu, ' '),
    messageId: mail.messageId,
    text: mail.text,
    html: mail.html,
    headers: { 'Auto-Submitted': 'auto-generated', ...leave },
    xMailer: false,
  };
}

async function inTime(sending: Promise<SMTPTransport.SentMessageInfo>): Promise<{ readonly response: string }> {
  let timer: NodeJS.Timeout | undefined;
  const late = new Promise<never>((_, reject) => {
    timer = setTimeout(() => {
      reject(new Error('The server took longer than half a minute'));
    }, WHOLE_MS);
  });
  sending.catch(() => undefined);
  try {
    return await Promise.race([sending, late]);
  } finally {
    clearTimeout(timer);
  }
}

const saidByServer = z.object({ responseCode: z.number(), command: z.string() });

/** Steps of the conversation at which an answer is about this mail, and not about us. */
const ABOUT_THE_MAIL = ['RCPT TO', 'DATA'];
const TOO_LARGE = 552;

async function handoverOf(error: unknown, transport: Transport): Promise<Handover> {
  const answer = error instanceof Error ? error.message : String(error);
  const said = saidByServer.safeParse(error);
  if (said.success && (ABOUT_THE_MAIL.includes(said.data.command) || said.data.responseCode === TOO_LARGE)) {
    if (said.data.responseCode >= 500) return { kind: 'refused', answer };
    if (said.data.responseCode !== 421) return { kind: 'later', answer };
  }
  // The conversation ended without an answer to this mail. If the server greets the next caller, it was this mail all the same.
  return { kind: (await isThere(transport)) ? 'later' : 'away', answer };
}

async function isThere(transport: Transport): Promise<boolean> {
  try {
    await transport.verify();
    return true;
  } catch {
    return false;
  }
}
