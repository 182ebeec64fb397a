import 'server-only';
import { seal, unseal } from './seal';

/** When a form was drawn, sealed, so that only this site can have written it. `about`: what the form is on; it opens for nothing else. */
export const makeStamp = (about: string, now: Date): string =>
  seal('form-stamp', about, Buffer.from(String(now.getTime()))).toString('base64url');

/** The age of a form in milliseconds, or null when its stamp is none of ours, was changed, or belongs to another form. */
export function stampAge(about: string, stamp: string, now: Date): number | null {
  const plain = unseal('form-stamp', about, Buffer.from(stamp, 'base64url'));
  const drawn = Number(plain?.toString('utf8') ?? Number.NaN);
  return Number.isSafeInteger(drawn) ? now.getTime() - drawn : null;
}
