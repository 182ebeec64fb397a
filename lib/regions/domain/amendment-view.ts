import type { Finding } from '@/lib/checks/domain/finding';
import type { Amendment, AmendmentId, AmendmentState } from './amendment';
import type { Decision } from './approval';
import type { ComparedEditions } from './compared-editions';
import type { Citation, Source } from './rule';
import type { Sheet } from './sheet';
import type { ItemKey } from './sheet-items';

/** What somebody typed into the form of one item and did not save yet; `version` counts how often it was kept. */
export type DraftEntry = {
  readonly item: ItemKey;
  readonly version: number;
  readonly values: Readonly<Record<string, string | readonly string[]>>;
  readonly savedAt: Date;
};

/** A remark tied to one line of an amendment; answers to it in the order they were given. People by the name they go by today. */
export type Remark = {
  readonly id: string;
  /** `rules/dk-register`, `text`, or `rules/dk-register#0` for a claim; the key of an item or a claim. */
  readonly line: string;
  readonly by: string;
  readonly isOwn: boolean;
  readonly words: string;
  readonly at: Date;
  readonly answers: readonly { readonly id: string; readonly by: string; readonly words: string; readonly at: Date }[];
  /** Marked as answered by a moderator. */
  readonly isAnswered: boolean;
};

/** A decision with the name of who took it. */
export type ToldDecision = Omit<Decision, 'by'> & { readonly by: string; readonly isOwn: boolean };

/** Another amendment under way that touches the same items. */
export type AlsoOpen = {
  readonly region: string;
  readonly state: AmendmentState;
  readonly since: Date;
  readonly items: readonly ItemKey[];
};

/** One place where mine and what came into use since are both otherwise than the base. */
export type Collision = {
  /** Item and field: `rules/dk-register says`. */
  readonly key: string;
  readonly item: ItemKey;
  readonly field: string;
};

/** A row of the three-way view: a field of an item in words. Null: not there in that version. */
export type ThreeWayRow = {
  readonly item: ItemKey;
  readonly title: string;
  readonly field: string;
  readonly was: string | null;
  readonly now: string | null;
  readonly mine: string | null;
  /** Both sides changed it, and not to the same. */
  readonly collides: boolean;
  /** `Collision.key` where it collides. */
  readonly key: string | null;
};

/** The sheet moved on since the amendment was begun. */
export type Stale = { readonly from: number | null; readonly to: number | null; readonly rows: readonly ThreeWayRow[] };

/** All that its author sees of an amendment. */
export type OwnAmendment = {
  readonly amendment: Amendment;
  /** The place's name as the amendment has it. */
  readonly name: string;
  readonly document: Sheet;
  readonly base: Sheet | null;
  /** Items that differ from the base. */
  readonly changed: readonly { readonly item: ItemKey; readonly title: string; readonly change: 'added' | 'changed' | 'withdrawn' }[];
  readonly entries: readonly DraftEntry[];
  readonly remarks: readonly Remark[];
  readonly decisions: readonly ToldDecision[];
  readonly stale: Stale | null;
  readonly alsoOpen: readonly AlsoOpen[];
};

/** What is checked before it is sent: findings, what it means, and trial pieces that come out otherwise. */
export type CheckedAmendment = { readonly findings: readonly Finding[]; readonly comparison: ComparedEditions };

/** A use of a source that a moderator reads before approving. */
export type ClaimToRead = {
  /** `rules/dk-register#0`. */
  readonly key: string;
  readonly item: ItemKey;
  /** Of the rule or term. */
  readonly title: string;
  readonly says: string;
  readonly citation: Citation;
  readonly source: Source;
  /** The kept page's file, where there is one. */
  readonly fileId: string | null;
  /** Ticked by this moderator on this version. */
  readonly isRead: boolean;
};

/** All that a moderator sees of an amendment that waits. */
export type Review = {
  readonly amendment: Amendment;
  readonly name: string;
  readonly author: string;
  readonly isOwn: boolean;
  readonly comparison: ComparedEditions;
  readonly findings: readonly Finding[];
  readonly claims: readonly ClaimToRead[];
  readonly remarks: readonly Remark[];
  readonly decisions: readonly ToldDecision[];
  readonly needed: 1 | 2;
  /** Approvals that count. */
  readonly given: 0 | 1;
  /** This moderator gave the one that counts. */
  readonly gaveIt: boolean;
  /** Moderators who could still approve: neither the author nor whoever has approved. */
  readonly othersLeft: number;
  /** Who else has it open, by name, and since when; null for nobody within a quarter of an hour. */
  readonly openElsewhere: { readonly by: string; readonly at: Date } | null;
  readonly alsoOpen: readonly AlsoOpen[];
  readonly stale: Stale | null;
};

/** A row of the sorting table. */
export type WaitingRow = {
  readonly id: AmendmentId;
  readonly region: string;
  readonly name: string;
  readonly summary: string;
  readonly state: AmendmentState;
  readonly sentAt: Date;
  /** Items that differ, rules among them. */
  readonly items: number;
  readonly rules: number;
  readonly needed: 1 | 2;
  readonly given: 0 | 1;
  readonly isOwn: boolean;
  readonly openedBy: string | null;
  readonly isStale: boolean;
};
