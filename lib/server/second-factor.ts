import 'server-only';
import { randomBytes } from 'node:crypto';
import { Secret, TOTP } from 'otpauth';
import { create } from 'qrcode';
import type { AccountId } from '@/lib/access/domain/actor';
import { STEP_MS } from '@/lib/accounts/domain/one-time-step';
import { CODES_GIVEN, readRecoveryCode, writeRecoveryCode } from '@/lib/accounts/domain/recovery-code';
import { keyedHash, seal, unseal } from './seal';

const SECRET_BYTES = 20;
/** Codes of the step before and after count too: clocks differ, and typing takes time. */
const BESIDE = 1;

function totpOf(secret: Buffer, label: string): TOTP {
  const own = new Uint8Array(secret).buffer;
  return new TOTP({ issuer: 'Footring', label, secret: new Secret({ buffer: own }), digits: 6, period: STEP_MS / 1000 });
}

/** A new secret, not in use until a code of it was given. */
export const newFactorSecret = (): Buffer => randomBytes(SECRET_BYTES);

/** The secret as people type it into an authenticator, in groups of four. */
export function writeFactorSecret(secret: Buffer): string {
  const text = new Secret({ buffer: new Uint8Array(secret).buffer }).base32;
  return text.replace(/(.{4})(?=.)/g, '$1 ');
}

export function readFactorSecret(text: string): Buffer | null {
  const letters = text.replace(/\s/g, '').toUpperCase();
  return /^[A-Z2-7]{32}$/.test(letters) ? Buffer.from(Secret.fromBase32(letters).bytes) : null;
}

export const sealFactorSecret = (id: AccountId, secret: Buffer): Buffer => seal('second-factor', id, secret);
export const unsealFactorSecret = (id: AccountId, sealed: Buffer): Buffer | null => unseal('second-factor', id, sealed);

/** How many steps from now the code lies; null when it is none of those beside. */
export function stepsFromNow(secret: Buffer, code: string, now: Date): number | null {
  const digits = code.normalize('NFKC').replace(/\s/g, '');
  if (!/^\d{6}$/.test(digits)) return null;
  return totpOf(secret, '').validate({ token: digits, timestamp: now.getTime(), window: BESIDE });
}

/** The code that is right now: for demo accounts, whose secret is shown as well. */
export const codeNow = (secret: Buffer, now: Date): string => totpOf(secret, '').generate({ timestamp: now.getTime() });

/** The squares of a QR code: `size` a side, without the quiet zone, and an SVG path of one unit a square. */
export type QrPath = { readonly size: number; readonly path: string };

/** What an authenticator reads from the screen. */
export function drawFactorSecret(secret: Buffer, label: string): QrPath {
  const { modules } = create(totpOf(secret, label).toString(), { errorCorrectionLevel: 'M' });
  const { size } = modules;
  const dark = Array.from({ length: size * size }, (_, at) => at).filter((at) => modules.data[at] === 1);
  return { size, path: dark.map((at) => `M${at % size} ${Math.floor(at / size)}h1v1h-1z`).join('') };
}

/** Ten new codes, to be shown once. */
export function newRecoveryCodes(): readonly string[] {
  const codes: string[] = [];
  while (codes.length < CODES_GIVEN) {
    const code = writeRecoveryCode(randomBytes(32));
    if (code !== null) codes.push(code);
  }
  return codes;
}

/** As a code is kept: useless to whoever reads the table without the site's secret. */
export const hashRecoveryCode = (id: AccountId, code: string): Buffer => keyedHash('recovery-code', `${id} ${readRecoveryCode(code)}`);
