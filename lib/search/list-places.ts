import 'server-only';
import type { Ctx } from '@/lib/server/ctx';
import { keptVocabulary } from './kept-vocabulary';

export type SearchPlace = { readonly code: string; readonly name: string };

/** Places that have a sheet, for a reader to name as their own. The layer below all of them is nobody's. */
export async function listPlaces(ctx: Ctx): Promise<readonly SearchPlace[]> {
  const { sheetNames } = await keptVocabulary(ctx.db);
  return [...sheetNames].filter(([code]) => code !== 'care').map(([code, name]) => ({ code, name }));
}
