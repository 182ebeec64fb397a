import 'server-only';
import { findToken } from '@/db/account-tokens';
import type { Ctx } from '@/lib/server/ctx';
import { tokenHash } from '@/lib/server/token';
import type { TokenKind } from './domain/session-age';
import { tokenText } from './schema';

/** Which kind a mailed link is of, if it can still be used. Looking at a link spends nothing: mail scanners do that too. */
export async function readMailedLink(ctx: Ctx, token: string, kinds: readonly TokenKind[]): Promise<TokenKind | null> {
  const text = tokenText.safeParse(token);
  if (!text.success) return null;
  for (const kind of kinds) {
    if ((await findToken(ctx.db, tokenHash(text.data), kind, ctx.now)) !== null) return kind;
  }
  return null;
}
