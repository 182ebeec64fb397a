import 'server-only';
import { err, ok, type Result } from '@/lib/kernel/result';
import { commonPasswords, hashPassword } from '@/lib/server/password';
import { passwordFault, type PasswordFault } from './domain/password-rules';

export type PasswordRefusal = { readonly kind: 'password'; readonly fault: PasswordFault };

/** The hash of a password somebody chose, or what is wrong with it. `own` are the person's name and address. */
export async function hashNewPassword(password: string, own: readonly string[]): Promise<Result<string, PasswordRefusal>> {
  const fault = passwordFault(password, commonPasswords(), own);
  return fault === null ? ok(await hashPassword(password)) : err({ kind: 'password', fault });
}
