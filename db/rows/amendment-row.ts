import { z } from 'zod';
import { AMENDMENT_STATES, type Amendment, type AmendmentId } from '@/lib/regions/domain/amendment';
import type { AccountId } from '@/lib/access/domain/actor';
import type { Sheet } from '@/lib/regions/domain/sheet';

/** An amendment with the whole sheet it proposes. */
export type StoredAmendment = { readonly amendment: Amendment; readonly document: Sheet };

const json = z
  .union([z.string(), z.looseObject({})])
  .transform((value): unknown => (typeof value === 'string' ? JSON.parse(value) : value));
const account = z.string().transform((id) => id as AccountId);

const head = {
  id: z.string().transform((id) => id as AmendmentId),
  region: z.string(),
  author_id: account,
  state: z.enum(AMENDMENT_STATES),
  version: z.number(),
  base_number: z.number().nullable(),
  summary: z.string(),
  intended: json.pipe(z.record(z.string(), z.string())),
  made_at: z.date(),
  changed_at: z.date(),
  sent_at: z.date().nullable(),
  opened_by: account.nullable(),
  opened_at: z.date().nullable(),
  edition_number: z.number().nullable(),
};
type HeadRow = z.output<z.ZodObject<typeof head>>;

const headOf = (row: HeadRow): Amendment => ({
  id: row.id,
  region: row.region,
  authorId: row.author_id,
  state: row.state,
  version: row.version,
  baseNumber: row.base_number,
  summary: row.summary,
  intended: row.intended,
  madeAt: row.made_at,
  changedAt: row.changed_at,
  sentAt: row.sent_at,
  openedBy: row.opened_by,
  openedAt: row.opened_at,
  editionNumber: row.edition_number,
});

export const amendmentRow = z.object(head).transform(headOf);

// Only what the schema of a sheet has parsed is ever written there.
export const storedAmendmentRow = z
  .object({ ...head, document: json })
  .transform(({ document, ...row }): StoredAmendment => ({ amendment: headOf(row), document: document as Sheet }));
