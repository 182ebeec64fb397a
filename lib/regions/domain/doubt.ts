import type { AccountId } from '@/lib/access/domain/actor';

export const DOUBT_STATES = ['waiting', 'answered', 'set-aside'] as const;
export type DoubtState = (typeof DOUBT_STATES)[number];

/** A reader's report that a rule is wrong. Who wrote it is not known. */
export type Doubt = {
  readonly id: string;
  readonly region: string;
  /** Null for a doubt about the sheet as a whole. */
  readonly rule: string | null;
  readonly words: string;
  /** Where the reader saw it told otherwise, in their words. */
  readonly elsewhere: string | null;
  /** As it was typed: shown as text, never made a link. */
  readonly link: string | null;
  readonly state: DoubtState;
  /** What an editor answered; shown on the rule. */
  readonly answer: string | null;
  /** Why it was set aside; read by editors alone. */
  readonly asideWhy: string | null;
  readonly answeredBy: AccountId | null;
  readonly madeAt: Date;
  readonly answeredAt: Date | null;
};

/** How many addresses of the web a doubt may name. Advertising names more. */
export const MOST_LINKS = 2;

const ADDRESS = /https?:\/\/|www\./gi;

/** Addresses of the web in these texts. */
export const linksIn = (texts: readonly string[]): number => texts.reduce((sum, text) => sum + (text.match(ADDRESS) ?? []).length, 0);

/** A form is sent too quickly for a person to have typed it, or after lying about so long that its rule may have changed. */
export type StampFault = 'too-quick' | 'too-old';

const LEAST_MS = 3000;
const MOST_MS = 24 * 60 * 60_000;

/** What is wrong with the age of a form when it is sent; null for an age that people's forms have. Unreadable counts as too old. */
export function stampFault(ageMs: number | null): StampFault | null {
  if (ageMs === null || ageMs > MOST_MS || ageMs < 0) return 'too-old';
  return ageMs < LEAST_MS ? 'too-quick' : null;
}

// Marks that nobody sees, or that turn the direction of reading, apart from line ends and tabs.
const UNSEEN = /[\p{Cc}\u061c\u200b\u200e\u200f\u202a-\u202e\u2060-\u2064\u2066-\u206f\ufeff\p{Cs}\p{Co}]/gu;

/** A text of several lines as it is kept: NFC, line ends alike, nothing in it that nobody sees. */
export const tidyWords = (typed: string): string =>
  typed
    .normalize('NFC')
    .replace(/\r\n?|[\u2028\u2029]/g, '\n')
    .replace(UNSEEN, (mark) => (mark === '\n' || mark === '\t' ? mark : ''))
    .replace(/\n{3,}/g, '\n\n')
    .trim();
