import { z } from 'zod';

const letter = z.object({
  name: z.string(),
  envelope: z.object({ from: z.string(), to: z.array(z.string()) }),
  headers: z.record(z.string(), z.array(z.string())),
  to: z.string(),
  subject: z.string(),
  text: z.string(),
  html: z.string(),
});

/** A mail as the stand-in of this run took it. */
export type Letter = z.output<typeof letter>;

/** Where the stand-in shows its mail; `npm test -- e2e` sets it. */
function boxAddress(): string {
  const address = process.env['FOOTRING_MAILBOX'];
  if (address === undefined || address === '') throw new Error('FOOTRING_MAILBOX is not set: it names the mail stand-in of this run.');
  return address;
}

async function ask(to: string, after: string, waitMs: number): Promise<readonly Letter[]> {
  const query = new URLSearchParams({ to, after, wait: String(waitMs) });
  const answer = await fetch(`${boxAddress()}/mails.json?${query.toString()}`);
  return z.array(letter).parse(await answer.json());
}

/** All mails to an address so far, oldest first. */
export const mailsTo = (address: string): Promise<readonly Letter[]> => ask(address, '', 0);

/**
 * The next mail to an address, waited for without sleeping; `after` is the mail that was seen last, and `about` a part of the subject.
 * Throws after half a minute.
 */
export async function nextMail(address: string, { after, about }: { after?: Letter; about?: string } = {}): Promise<Letter> {
  let last = after?.name ?? '';
  const until = Date.now() + 30_000;
  while (Date.now() < until) {
    for (const found of await ask(address, last, until - Date.now())) {
      last = found.name;
      if (about === undefined || found.subject.includes(about)) return found;
    }
  }
  throw new Error(`No mail came to ${address}${about === undefined ? '' : ` about "${about}"`}.`);
}

/** The first address in a mail that leads to this site, as a path. */
export function linkIn({ text }: Letter): string {
  const found = /https?:\/\/\S+/.exec(text)?.[0];
  if (found === undefined) throw new Error(`There is no link in this mail:\n${text}`);
  const url = new URL(found);
  return url.pathname + url.search;
}
