import 'server-only';
import { listNamed } from '@/db/account-search';
import { rankOf } from '@/lib/access/domain/actor';
import { words } from '@/lib/kernel/words';
import type { Ctx } from '@/lib/server/ctx';

/** By which name people go today: editors and above by the one they chose, whoever is that no longer by none. */
export async function namePeople(db: Ctx['db'], ids: readonly (string | null)[]): Promise<(id: string) => string> {
  const wanted = [...new Set(ids.flatMap((id) => id ?? []))];
  const found = new Map((await listNamed(db, wanted)).map((person) => [String(person.id), person]));
  return (id) => {
    const person = found.get(id);
    const isNamed = person !== undefined && rankOf(person.role) >= rankOf('editor') && ['open', 'leaving'].includes(person.state);
    return isNamed ? person.name : words('day-book.whom.former-editor');
  };
}
