/** An address as we keep and compare it: one mailbox, lower case, its domain in the form that mail servers read. */
export type EmailAddress = string & { readonly __brand: 'EmailAddress' };

const LONGEST = 254;
const LOCAL = /^[a-z0-9!#$%&'*+/=?^_{|}~`-]+(\.[a-z0-9!#$%&'*+/=?^_{|}~`-]+)*$/;
const DOMAIN = /^([a-z0-9]([a-z0-9-]{0,61}[a-z0-9])?\.)+[a-z][a-z0-9-]{0,61}[a-z0-9]$/;
// What could end a line, open a second address, or step out of the mailbox's name; also the marks nobody sees.
const NEVER = /[\s,;:<>()[\]\\"\p{C}]/u;

/**
 * The one address a person means: blanks around it go, width and case are folded (NFKC, lower case), a domain in other letters is
 * written as mail servers want it. Null for anything else, several addresses and quoted names among them.
 */
export function readEmailText(text: string): string | null {
  if (text.length > LONGEST * 4) return null;
  const folded = text.trim().normalize('NFKC').toLowerCase();
  if (NEVER.test(folded)) return null;
  const at = folded.indexOf('@');
  const local = folded.slice(0, Math.max(at, 0));
  const domain = asciiDomain(folded.slice(at + 1));
  const address = `${local}@${domain}`;
  return LOCAL.test(local) && local.length <= 64 && DOMAIN.test(domain) && address.length <= LONGEST ? address : null;
}

function asciiDomain(domain: string): string {
  if (!/^[\p{L}\p{N}.-]+$/u.test(domain)) return '';
  const written = `http://${domain}`;
  return URL.canParse(written) ? new URL(written).hostname : '';
}
