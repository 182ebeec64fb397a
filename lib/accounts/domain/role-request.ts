import type { AccountId } from '@/lib/access/domain/actor';

export const REQUEST_STATES = ['waiting', 'granted', 'refused', 'withdrawn'] as const;
export type RequestState = (typeof REQUEST_STATES)[number];

/** A maker's wish to become an editor, and what a steward said to it. */
export type RoleRequest = {
  readonly id: string;
  readonly accountId: AccountId;
  readonly why: string;
  /** Codes of the places they would write about. */
  readonly regions: readonly string[];
  readonly state: RequestState;
  readonly answer: string | null;
  readonly answeredBy: AccountId | null;
  readonly madeAt: Date;
  readonly answeredAt: Date | null;
};
