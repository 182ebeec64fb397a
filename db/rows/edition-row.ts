import { z } from 'zod';
import type { Sheet } from '@/lib/regions/domain/sheet';

/** An edition without its document. */
export type EditionHead = {
  readonly region: string;
  readonly number: number;
  readonly hash: string;
  readonly origin: 'seed' | 'amendment' | 'withdrawal';
  readonly summary: string;
  readonly inUseFrom: Date;
};

export type Edition = EditionHead & { readonly sheet: Sheet };

const head = {
  region: z.string(),
  number: z.number(),
  hash: z.string(),
  origin: z.enum(['seed', 'amendment', 'withdrawal']),
  summary: z.string(),
  in_use_from: z.date(),
};

export const editionHeadRow = z.object(head).transform(({ in_use_from, ...row }): EditionHead => ({ ...row, inUseFrom: in_use_from }));

// Documents of the first editions have no trial pieces. All were validated when they were published and cannot be changed since:
// no grant lets anyone, and the hash stands beside it.
export const editionRow = z
  .object({ ...head, document: z.union([z.string(), z.looseObject({})]) })
  .transform(({ in_use_from, document, ...row }): Edition => {
    const sheet = (typeof document === 'string' ? JSON.parse(document) : document) as Omit<Sheet, 'trials'> & Partial<Sheet>;
    return { ...row, inUseFrom: in_use_from, sheet: { ...sheet, trials: sheet.trials ?? [] } };
  });

export const sheetLockRow = z.object({ region: z.string(), edition_number: z.number() });
