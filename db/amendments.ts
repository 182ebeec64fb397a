import type { Knex } from 'knex';
import type { AccountId } from '@/lib/access/domain/actor';
import { canonicalJson } from '@/lib/kernel/canonical-json';
import type { Amendment, AmendmentId, AmendmentState } from '@/lib/regions/domain/amendment';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { amendmentRow, storedAmendmentRow, type StoredAmendment } from './rows/amendment-row';
import type { Trx } from './transaction';
import { storedJson } from './well-formed';

export type { StoredAmendment } from './rows/amendment-row';

const HEAD = [
  'id',
  'region',
  'author_id',
  'state',
  'version',
  'base_number',
  'summary',
  'intended',
  'made_at',
  'changed_at',
  'sent_at',
  'opened_by',
  'opened_at',
  'edition_number',
] as const;

const MOST = 500;

export type NewAmendment = {
  readonly id: AmendmentId;
  readonly region: string;
  readonly authorId: AccountId;
  readonly baseNumber: number | null;
  readonly document: Sheet;
  readonly at: Date;
};

/** A new draft. */
export async function insertAmendment(trx: Trx, { id, region, authorId, baseNumber, document, at }: NewAmendment): Promise<void> {
  await trx('amendments').insert({
    id,
    region,
    author_id: authorId,
    state: 'draft',
    version: 1,
    base_number: baseNumber,
    summary: '',
    intended: '{}',
    document: storedJson(document),
    made_at: at,
    changed_at: at,
  });
}

export async function findAmendment(db: Knex, id: string): Promise<StoredAmendment | null> {
  const row: unknown = await db('amendments')
    .where({ id })
    .select(...HEAD, 'document')
    .first();
  return row === undefined ? null : storedAmendmentRow.parse(row);
}

/** Holds the amendment for the rest of the transaction. Before any plain read in it, which would freeze what it sees. */
export async function lockAmendment(trx: Trx, id: string): Promise<StoredAmendment | null> {
  const row: unknown = await trx('amendments')
    .where({ id })
    .select(...HEAD, 'document')
    .forUpdate()
    .first();
  return row === undefined ? null : storedAmendmentRow.parse(row);
}

export type AmendmentPatch = {
  readonly state?: AmendmentState;
  readonly document?: Sheet;
  readonly baseNumber?: number | null;
  readonly summary?: string;
  readonly intended?: Amendment['intended'];
  readonly sentAt?: Date | null;
  readonly editionNumber?: number;
  readonly at: Date;
};

/** Changes the amendment if it is still in that version, and counts it on. False when it has moved on. */
export async function updateAmendment(trx: Trx, id: string, version: number, patch: AmendmentPatch): Promise<boolean> {
  const { state, document, baseNumber, summary, intended, sentAt, editionNumber, at } = patch;
  const changed = await trx('amendments')
    .where({ id, version })
    .update({
      version: version + 1,
      changed_at: at,
      ...(state === undefined ? {} : { state }),
      ...(document === undefined ? {} : { document: storedJson(document) }),
      ...(baseNumber === undefined ? {} : { base_number: baseNumber }),
      ...(summary === undefined ? {} : { summary }),
      ...(intended === undefined ? {} : { intended: canonicalJson(intended) }),
      ...(sentAt === undefined ? {} : { sent_at: sentAt }),
      ...(editionNumber === undefined ? {} : { edition_number: editionNumber }),
    });
  return changed === 1;
}

/** Notes who looks at it. No change of the amendment: its version stays. */
export async function noteOpened(db: Knex, id: string, by: AccountId, at: Date): Promise<void> {
  await db('amendments').where({ id }).update({ opened_by: by, opened_at: at });
}

/** A person's own amendments, the one touched last first. */
export async function listAmendmentsOf(db: Knex, author: AccountId, most = MOST): Promise<readonly StoredAmendment[]> {
  const rows: unknown[] = await db('amendments')
    .where({ author_id: author })
    .orderBy('changed_at', 'desc')
    .limit(most)
    .select(...HEAD, 'document');
  return rows.map((row) => storedAmendmentRow.parse(row));
}

export type SentFilter = {
  readonly states: readonly AmendmentState[];
  readonly region?: string | undefined;
  /** Sent before this instant. */
  readonly before?: Date | undefined;
};

/** What was sent and is in one of these states, the longest ago first. */
export async function listSent(db: Knex, { states, region, before }: SentFilter): Promise<readonly StoredAmendment[]> {
  const query = db('amendments')
    .whereIn('state', [...states])
    .whereNotNull('sent_at')
    .orderBy('sent_at')
    .orderBy('id')
    .limit(MOST)
    .select(...HEAD, 'document');
  if (region !== undefined) void query.where({ region });
  if (before !== undefined) void query.where('sent_at', '<', before);
  const rows: unknown[] = await query;
  return rows.map((row) => storedAmendmentRow.parse(row));
}

/** The same without documents: enough to see that something came or went. */
export async function listSentHeads(db: Knex, { states, region }: SentFilter): Promise<readonly Amendment[]> {
  const query = db('amendments')
    .whereIn('state', [...states])
    .whereNotNull('sent_at')
    .orderBy('sent_at')
    .orderBy('id')
    .limit(MOST)
    .select(...HEAD);
  if (region !== undefined) void query.where({ region });
  const rows: unknown[] = await query;
  return rows.map((row) => amendmentRow.parse(row));
}

/** Amendments to a sheet that can still come into use, the oldest first. */
export async function listOpenOn(db: Knex, region: string): Promise<readonly StoredAmendment[]> {
  const rows: unknown[] = await db('amendments')
    .where({ region })
    .whereNotIn('state', ['in-use', 'withdrawn'])
    .orderBy('made_at')
    .limit(MOST)
    .select(...HEAD, 'document');
  return rows.map((row) => storedAmendmentRow.parse(row));
}

/** Takes away what a person never sent; what others have read stays. */
export async function deleteUnsentOf(trx: Trx, author: AccountId): Promise<void> {
  const own = trx('amendments').where({ author_id: author }).select('id');
  await trx('amendment_entries').whereIn('amendment_id', own).del();
  await trx('amendments').where({ author_id: author }).whereNull('sent_at').del();
}
