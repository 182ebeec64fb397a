/** What became of one attempt to hand a mail over. */
export type Handover =
  | { readonly kind: 'taken'; readonly answer: string }
  /** The server will never take this mail for this address. */
  | { readonly kind: 'refused'; readonly answer: string }
  /** It did not take this mail now. */
  | { readonly kind: 'later'; readonly answer: string }
  /** It took no mail at all: not there, not well, or it does not know us. No fault of this mail's. */
  | { readonly kind: 'away'; readonly answer: string };

/** What is written down after an attempt. */
export type MailEnd =
  | { readonly state: 'sent' | 'bounced' | 'parked'; readonly lastAnswer: string }
  /** To be tried again. `counts` is false when the fault was none of this mail's. */
  | { readonly state: 'waiting'; readonly lastAnswer: string; readonly afterMs: number; readonly counts: boolean };

/** How often a mail or a job is tried before it waits for a steward. */
export const MOST_TRIES = 8;

/** How long to wait between tries. */
export type Patience = { readonly baseMs: number; readonly mostMs: number };
export const MAIL_PATIENCE: Patience = { baseMs: 30_000, mostMs: 3_600_000 };
export const AWAY_PATIENCE: Patience = { baseMs: 500, mostMs: 20_000 };

/** A wait that doubles with each try, drawn evenly between nothing and that, so that many do not come back at once. `chance` is in [0, 1). */
export function waitBefore(nextTry: number, chance: number, { baseMs, mostMs }: Patience): number {
  return Math.round(chance * Math.min(mostMs, baseMs * 2 ** nextTry));
}

/** What follows from an attempt; `tries` includes it. */
export function afterHandover(handover: Handover, tries: number, chance: number, patience: Patience): MailEnd {
  const lastAnswer = handover.answer;
  switch (handover.kind) {
    case 'taken':
      return { state: 'sent', lastAnswer };
    case 'refused':
      return { state: 'bounced', lastAnswer };
    case 'later':
      if (tries >= MOST_TRIES) return { state: 'parked', lastAnswer };
      return { state: 'waiting', lastAnswer, afterMs: waitBefore(tries, chance, patience), counts: true };
    case 'away':
      return { state: 'waiting', lastAnswer, afterMs: 0, counts: false };
  }
}
