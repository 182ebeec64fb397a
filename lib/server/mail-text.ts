import 'server-only';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { createTranslator } from 'use-intl/core';
import { LOCALE } from '@/lib/kernel/words';
import { readEnv } from './env';
import { mailHtml, mailPlain, type MailValue, type Restore } from './mail-shape';

type Named = { readonly name: string };
/** An address on this site, put together from the setting. */
type Linked = Named & { readonly link: string };
type Timed = Linked & { readonly minutes: number };

/** What each mail is told. Members that end in `link` become links; all others are shown as they are, letter for letter. */
export type MailValues = {
  'confirm-address': Timed;
  'sign-in-link': Timed;
  'reset-password': Timed;
  'password-changed': Linked;
  'address-changes': Timed;
  'address-changed': Linked;
  'second-factor-changed': Linked & { readonly change: 'on' | 'off' | 'codes' | 'code-used' };
  'role-changed': Linked & { readonly role: 'maker' | 'editor' | 'moderator' | 'steward'; readonly reason: string };
  'role-answer': Linked & { readonly answer: 'granted' | 'refused'; readonly reason: string };
  /** `on` as `sayDate` writes it. */
  'account-leaving': Linked & { readonly on: string };
  'amendment-decided': Linked & {
    readonly answer: 'used' | 'returned' | 'held' | 'overtaken';
    readonly place: string;
    /** The number it came into use as; empty otherwise. */
    readonly edition: string;
    readonly reason: string;
  };
  'account-closed': Linked & { readonly reason: string };
  'account-reopened': Linked & { readonly reason: string };
  'someone-tried-to-sign-up': Linked & { readonly resetLink: string };
};
export type MailName = keyof MailValues;

export const MAIL_NAMES: readonly MailName[] = [
  'confirm-address',
  'sign-in-link',
  'reset-password',
  'password-changed',
  'address-changes',
  'address-changed',
  'second-factor-changed',
  'role-changed',
  'role-answer',
  'account-leaving',
  'amendment-decided',
  'account-closed',
  'account-reopened',
  'someone-tried-to-sign-up',
];

export type WrittenMail = { readonly subject: string; readonly text: string; readonly html: string };

const SUBJECT_MOST = 150;

/** Writes a mail from content/mail. Throws when a value is missing that its text names: a fault of ours, found by a test. */
export function writeMail<N extends MailName>(name: N, values: MailValues[N]): WrittenMail {
  const template = readTemplate(name);
  const given: Readonly<Record<string, string | number>> = { ...values, site: new URL(readEnv().site).host };
  const subject = oneLine(format(template.subject, given)).slice(0, SUBJECT_MOST);
  // Values are put in only after the Markdown has been read, so that no name or reason can become markup.
  const { text, restore } = withMarks(given);
  const why = format(template.why, text);
  const parts = { body: format(template.body, text), footer: format(readMailFile('footer').trim(), { ...text, why }) };
  return { subject, text: mailPlain(parts, restore), html: mailHtml(parts, restore, subject) };
}

type Template = { readonly subject: string; readonly why: string; readonly body: string };
const templates = new Map<MailName, Template>();

function readTemplate(name: MailName): Template {
  const found = templates.get(name) ?? parseTemplate(name, readMailFile(name));
  templates.set(name, found);
  return found;
}

const readMailFile = (name: string): string => readFileSync(join(process.cwd(), 'content', 'mail', `${name}.md`), 'utf8');

function parseTemplate(name: MailName, source: string): Template {
  const [, subject, why, body] = /^---\nsubject: (.+)\nwhy: (.+)\n---\n([\s\S]+)$/.exec(source) ?? [];
  if (subject === undefined || why === undefined || body === undefined) {
    throw new Error(`content/mail/${name}.md does not begin with its subject and why it is sent`);
  }
  return { subject, why, body: body.trim() };
}

function format(text: string, values: Readonly<Record<string, string | number>>): string {
  const translate = createTranslator({
    locale: LOCALE,
    messages: { text },
    onError(error) {
      throw error;
    },
  });
  return translate('text', values);
}

/** No line of a header can begin anew inside a value. */
const oneLine = (text: string): string => text.replace(/[\p{Cc}\u2028\u2029]+/gu, ' ').trim();

/** Words that choose a branch of the text; they are never shown. */
const CHOOSING = ['change', 'role', 'answer'];
const MARK = /\ue000(\w+)\ue001/g;

/** The values with a mark in place of each text, and what puts the texts back into what was made of the marks. */
function withMarks(values: Readonly<Record<string, string | number>>): { text: Record<string, string | number>; restore: Restore } {
  const text: Record<string, string | number> = {};
  const kept = new Map<string, MailValue>();
  for (const [key, value] of Object.entries(values)) {
    const isShown = typeof value === 'string' && !CHOOSING.includes(key);
    text[key] = isShown ? `\ue000${key}\ue001` : value;
    if (isShown) kept.set(key, { text: value.replace(/[\ue000\ue001]/g, ''), isLink: /link$/i.test(key) });
  }
  const restore: Restore = (made, say) =>
    made.replace(MARK, (_, key: string) => {
      const value = kept.get(key);
      return value === undefined ? '' : say(value);
    });
  return { text, restore };
}
