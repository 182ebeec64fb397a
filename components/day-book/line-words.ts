import type { Said, ToldLine } from '@/lib/day-book/domain/told-line';
import type { Act } from '@/lib/day-book/domain/kinds';
import { words } from '@/lib/kernel/words';

type Told = { readonly who: string; readonly whom: string; readonly from: string; readonly to: string; readonly kind: string };

const SENTENCES: Readonly<Record<Act, (told: Told) => string>> = {
  'role.grant': ({ who, whom, from, to }) => words('day-book.act.role.grant', { who, whom, from, to }),
  'role.take': ({ who, whom, from, to }) => words('day-book.act.role.take', { who, whom, from, to }),
  'role.refuse': ({ who }) => words('day-book.act.role.refuse', { who }),
  'account.close': ({ who }) => words('day-book.act.account.close', { who }),
  'account.reopen': ({ who }) => words('day-book.act.account.reopen', { who }),
  'account.forget': () => words('day-book.act.account.forget'),
  'outbox.retry': ({ who, kind }) => words('day-book.act.outbox.retry', { who, kind }),
};

const whoWords = (said: Said): string => (said.kind === 'named' ? said.name : words(`day-book.who.${said.kind}`));

/** Inside a sentence. Nobody but editors and above is ever spoken of there. */
const whomWords = (said: Said | null): string => (said?.kind === 'named' ? said.name : words('day-book.whom.former-editor'));

/** What happened, in one sentence. */
export function sayLine({ act, did, who, whom, change, subjectKind }: ToldLine): string {
  if (act === null) return words('day-book.act.other', { who: whoWords(who), did });
  return SENTENCES[act]({
    who: whoWords(who),
    whom: whomWords(whom),
    from: change === null ? '' : words(`day-book.role.${change.from}`),
    to: change === null ? '' : words(`day-book.role.${change.to}`),
    kind: subjectKind,
  });
}
