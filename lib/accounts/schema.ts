import { z } from 'zod';
import type { AccountId } from '@/lib/access/domain/actor';
import { regionCode } from '@/lib/kernel/shapes';
import { words } from '@/lib/kernel/words';
import { UNITS } from './domain/account';
import { CURRENCIES } from './domain/currencies';
import { readEmailText, type EmailAddress } from './domain/email-address';
import { nameFault, tidyName, type NameFault } from './domain/person-name';
import { LONGEST_PASSWORD, readPassword } from './domain/password-rules';

/** The key of a form: one a submission. */
const key = z.uuid({ error: () => words('accounts.fault.form') });

const text = (most: number) =>
  z.string({ error: () => words('accounts.fault.form') }).max(most, { error: () => words('accounts.fault.long') });

export const email = text(1000).transform((typed, ctx): EmailAddress => {
  const address = readEmailText(typed);
  if (address !== null) return address as EmailAddress;
  ctx.addIssue({ code: 'custom', message: words('accounts.fault.email') });
  return z.NEVER;
});

const NAME_FAULTS: Readonly<Record<NameFault, () => string>> = {
  empty: () => words('accounts.fault.name.empty'),
  'too-long': () => words('accounts.fault.name.long'),
  reserved: () => words('accounts.fault.name.reserved'),
};

export const personName = text(800).transform((typed, ctx): string => {
  const name = tidyName(typed);
  const fault = nameFault(name);
  if (fault === null) return name;
  ctx.addIssue({ code: 'custom', message: NAME_FAULTS[fault]() });
  return z.NEVER;
});

/** Any text: what a password must be is asked only of new ones, in the use case. */
const password = text(LONGEST_PASSWORD * 4)
  .min(1, { error: () => words('accounts.fault.password.empty') })
  .transform(readPassword);

const token = z.string().regex(/^[A-Za-z0-9_-]{43}$/);
const code = text(40)
  .trim()
  .min(1, { error: () => words('accounts.fault.code.empty') });
/** Read by `nextPlace` where it is used. */
const next = z.string().max(2000).optional();

export const accountId = z.uuid().transform((id) => id as AccountId);

export const signUpInput = z.strictObject({ key, email, name: personName, password });
export const signInInput = z.strictObject({ key, email, password, next });
export const mailInput = z.strictObject({ key, email, next });
export const tokenInput = z.strictObject({ key, token });
export const resetInput = z.strictObject({ key, token, password });
export const againInput = z.strictObject({ key, password, next });
export const codeInput = z.strictObject({ key, code, next });
export const renameInput = z.strictObject({ key, name: personName });
export const passwordInput = z.strictObject({ key, current: password, password });
export const addressInput = z.strictObject({ key, email });
export const factorInput = z.strictObject({ key, secret: text(80), code });
export const keyInput = z.strictObject({ key });
export const sessionInput = z.strictObject({ key, handle: z.string().regex(/^[0-9a-f]{16}$/) });

const choice = <T extends z.ZodType>(of: T) => z.union([z.literal('').transform(() => null), of]).optional();

export const preferencesInput = z
  .strictObject({
    key,
    region: choice(regionCode),
    currency: choice(z.enum(CURRENCIES, { error: () => words('accounts.fault.currency') })),
    units: z.enum(UNITS, { error: () => words('accounts.fault.units') }),
  })
  .transform(({ key: of, region, currency, units }) => ({ key: of, region: region ?? null, currency: currency ?? null, units }));

const WHY_MOST = 2000;
const PLACES_MOST = 40;

export const roleAskInput = z
  .strictObject({
    key,
    why: z
      .string({ error: () => words('accounts.fault.why.empty') })
      .max(WHY_MOST * 4, { error: () => words('accounts.fault.why.long') })
      .transform((typed) => typed.normalize('NFC').replace(/\r\n?/g, '\n').trim())
      .pipe(
        z
          .string()
          .min(1, { error: () => words('accounts.fault.why.empty') })
          .max(WHY_MOST, { error: () => words('accounts.fault.why.long') }),
      ),
    regions: z.union([regionCode.transform((one) => [one]), z.array(regionCode).max(PLACES_MOST)]).optional(),
  })
  .transform(({ key: of, why, regions }) => ({ key: of, why, regions: [...new Set(regions ?? [])] }));

export const requestInput = z.strictObject({ key, id: z.uuid() });
export const tokenText = token;
export const jobId = z.uuid();

export type SignUpInput = z.output<typeof signUpInput>;
export type SignInInput = z.output<typeof signInInput>;
export type MailInput = z.output<typeof mailInput>;
export type TokenInput = z.output<typeof tokenInput>;
export type ResetInput = z.output<typeof resetInput>;
export type AgainInput = z.output<typeof againInput>;
export type CodeInput = z.output<typeof codeInput>;
export type RenameInput = z.output<typeof renameInput>;
export type PasswordInput = z.output<typeof passwordInput>;
export type AddressInput = z.output<typeof addressInput>;
export type FactorInput = z.output<typeof factorInput>;
export type KeyInput = z.output<typeof keyInput>;
export type SessionInput = z.output<typeof sessionInput>;
export type PreferencesInput = z.output<typeof preferencesInput>;
export type RoleAskInput = z.output<typeof roleAskInput>;
export type RequestInput = z.output<typeof requestInput>;
