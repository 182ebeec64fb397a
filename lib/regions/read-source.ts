import 'server-only';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { findText, readSourceAddress, type CitedText } from './domain/cited-text';
import { listSheetsInUse } from './list-sheets-in-use';

/** A text by its address, "eu--reg-1935-2004", with all that rests on it in the sheets in use. */
export async function readSource(ctx: Ctx, address: string): Promise<Result<CitedText, { kind: 'not-found' }>> {
  const asked = readSourceAddress(address);
  if (asked === null) return err({ kind: 'not-found' });
  const sheets = (await listSheetsInUse(ctx)).map(({ sheet }) => sheet);
  const found = findText(sheets, asked);
  return found === null ? err({ kind: 'not-found' }) : ok(found);
}
