import type { Said, ToldLine } from '@/lib/day-book/domain/told-line';
import type { Act } from '@/lib/day-book/domain/kinds';
import { placeWords } from '@/lib/regions/domain/condition-words';
import { words } from '@/lib/kernel/words';

type Told = {
  readonly who: string;
  readonly whom: string;
  readonly from: string;
  readonly to: string;
  readonly kind: string;
  readonly place: string;
  readonly edition: number;
};

const SENTENCES: Readonly<Record<Act, (told: Told) => string>> = {
  'amendment.send': ({ who, place }) => words('day-book.act.amendment.send', { who, place }),
  'amendment.hold': ({ who, place }) => words('day-book.act.amendment.hold', { who, place }),
  'amendment.send-back': ({ who, place }) => words('day-book.act.amendment.sendBack', { who, place }),
  'amendment.once-approve': ({ who, place }) => words('day-book.act.amendment.onceApprove', { who, place }),
  'amendment.approve': ({ who, place, edition }) => words('day-book.act.amendment.approve', { who, place, edition }),
  'amendment.refuse-stale': ({ who, place }) => words('day-book.act.amendment.refuseStale', { who, place }),
  'edition.withdraw': ({ who, place, edition }) => words('day-book.act.edition.withdraw', { who, place, edition }),
  'doubt.answer': ({ who, place }) => words('day-book.act.doubt.answer', { who, place }),
  'keeper.take-on': ({ who, place }) => words('day-book.act.keeper.takeOn', { who, place }),
  'keeper.give-up': ({ who, place }) => words('day-book.act.keeper.giveUp', { who, place }),
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
export function sayLine({ act, did, who, whom, change, subjectKind, region, edition }: ToldLine): string {
  if (act === null) return words('day-book.act.other', { who: whoWords(who), did });
  return SENTENCES[act]({
    who: whoWords(who),
    whom: whomWords(whom),
    from: change === null ? '' : words(`day-book.role.${change.from}`),
    to: change === null ? '' : words(`day-book.role.${change.to}`),
    kind: subjectKind,
    place: region === null ? '' : placeWords(region),
    edition: edition ?? 0,
  });
}
