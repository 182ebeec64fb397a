import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import { insertRoleRequest } from '@/db/role-requests';
import { db } from '@/db/connection';
import { putArchive } from '@/db/account-exports';
import { enqueueMail } from '@/db/outbox';
import { inTransaction } from '@/db/transaction';
import type { AccountId } from '@/lib/access/domain/actor';
import type { Action } from '@/lib/access/domain/policy';
import { answerRequest } from '@/lib/accounts/answer-request';
import { askAddressChange } from '@/lib/accounts/ask-address-change';
import { askForRole } from '@/lib/accounts/ask-for-role';
import { beginExport } from '@/lib/accounts/begin-export';
import { changePassword } from '@/lib/accounts/change-password';
import { changeRole } from '@/lib/accounts/change-role';
import { closeAccount } from '@/lib/accounts/close-account';
import type { EmailAddress } from '@/lib/accounts/domain/email-address';
import { endOtherSessions } from '@/lib/accounts/end-other-sessions';
import { endOwnSession } from '@/lib/accounts/end-own-session';
import { giveSecondFactor } from '@/lib/accounts/give-second-factor';
import { keepAccount } from '@/lib/accounts/keep-account';
import { leaveAccount } from '@/lib/accounts/leave-account';
import { mailConfirmationAgain } from '@/lib/accounts/mail-confirmation-again';
import { readArchive } from '@/lib/accounts/read-export';
import { renameAccount } from '@/lib/accounts/rename-account';
import { renewRecoveryCodes } from '@/lib/accounts/renew-recovery-codes';
import { reopenAccount } from '@/lib/accounts/reopen-account';
import { setOwnPreferences } from '@/lib/accounts/set-own-preferences';
import { signInAgain } from '@/lib/accounts/sign-in-again';
import { turnOffSecondFactor } from '@/lib/accounts/turn-off-second-factor';
import { turnOnSecondFactor } from '@/lib/accounts/turn-on-second-factor';
import { withdrawRoleRequest } from '@/lib/accounts/withdraw-role-request';
import type { FileId } from '@/lib/files/domain/kept-file';
import { keepPageSeen } from '@/lib/files/keep-page-seen';
import { readFile } from '@/lib/files/read-file';
import { ok } from '@/lib/kernel/result';
import { retryParked } from '@/lib/notices/retry-parked';
import { addRemark } from '@/lib/regions/add-remark';
import { answerRemark } from '@/lib/regions/answer-remark';
import { approveAmendment } from '@/lib/regions/approve-amendment';
import type { AmendmentId } from '@/lib/regions/domain/amendment';
import { holdAmendment } from '@/lib/regions/hold-amendment';
import { markRemark } from '@/lib/regions/mark-remark';
import { releaseAmendment } from '@/lib/regions/release-amendment';
import { sendBackAmendment } from '@/lib/regions/send-back-amendment';
import { tickClaim } from '@/lib/regions/tick-claim';
import { waitingStamp } from '@/lib/regions/waiting-stamp';
import { withdrawEdition } from '@/lib/regions/withdraw-edition';
import { answerDoubt } from '@/lib/regions/answer-doubt';
import { becomeKeeper } from '@/lib/regions/become-keeper';
import { setAsideDoubt } from '@/lib/regions/set-aside-doubt';
import { stopKeeping } from '@/lib/regions/stop-keeping';
import { takeDoubtUp } from '@/lib/regions/take-doubt-up';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { newId } from '@/lib/server/new-id';
import type { CurrentSession } from '@/lib/server/session';
import { handleOf } from '@/lib/server/token';
import { DRAFT_DOORS } from './draft-doors';
import { aKeptFile } from './kept-files';
import { aDoubt, aDoubtedPlace, aKept, aSetAside } from './doubts';
import { anAccount, aSession, NOW } from './people';
import { aSentAmendment } from './sent-amendments';

/** Whoever presses: their account, its session's row, and what a use case gets. Somebody without an account has an id nobody has. */
export type Presser = { readonly id: AccountId; readonly hasAccount: boolean; readonly ctx: ActorCtx; readonly session: CurrentSession };
export type Whose = 'own' | 'other' | 'none';
export const WHOSE: readonly Whose[] = ['own', 'other', 'none'];

type End = { readonly ok: true } | { readonly ok: false; readonly error: { readonly kind: string } };

/**
 * What may stand behind a server action or a handler. `asks`: the line of the policy that decides; `press` does it to a record of
 * one's own, of another's, or one that is not there; `ends` says how that ends for those who may: "ok", "ok, nothing" when nothing may
 * change by it, or the kind of the refusal. A door without records is pressed on oneself alone.
 */
export type Door =
  | { readonly open: string }
  | {
      readonly asks: Action;
      readonly press: (who: Presser, record: string) => Promise<End>;
      readonly record?: (whose: AccountId) => Promise<string>;
      readonly ends: Partial<Readonly<Record<Whose, string>>>;
    };

const key = (): string => randomUUID();
const reason = 'A reason of the tests.';
const itself = { own: 'ok' } as const;
const theirsAlone = { own: 'ok', other: 'not-found', none: 'not-found' } as const;

const put = async (work: Parameters<typeof inTransaction<{ ok: true; value: null }>>[1]): Promise<void> => {
  await inTransaction(db, work);
};

async function aRequest(accountId: AccountId): Promise<string> {
  const id = newId(NOW);
  await put(async (trx) => {
    await insertRoleRequest(trx, { id, accountId, why: 'tests', regions: [], at: NOW });
    return ok(null);
  });
  return id;
}

async function anArchive(accountId: AccountId): Promise<string> {
  const id = newId(NOW);
  await putArchive(db, { id, accountId, archive: Buffer.from('zip'), at: NOW });
  return id;
}

async function aParkedMail(accountId: AccountId): Promise<string> {
  await put(async (trx) => {
    const mail = { subject: 's', text: 't', html: 'h' };
    await enqueueMail(trx, { accountId, address: 'parked@example.test', mail, kind: 'tests', at: NOW });
    await trx('outbox').where({ account_id: accountId }).update({ state: 'parked' });
    return ok(null);
  });
  const ids: unknown = await db('outbox').where({ account_id: accountId }).pluck('id');
  return z.tuple([z.string()]).parse(ids)[0];
}

const ACCOUNT = 'app/(account)/actions.ts';
const BENCH = 'app/(workshop)/bench/actions.ts';
const OWN = 'app/(workshop)/bench/account/actions.ts';
const FACTOR = 'app/(workshop)/bench/account/second-factor/actions.ts';
const DESK = 'app/(desk)/stewards/actions.ts';
const TABLE = 'app/(desk)/sorting-table/actions.ts';
const CHECK = 'app/(public)/check/actions.ts';
const DOUBTS = 'app/(desk)/doubts/actions.ts';
const KEEPING = 'app/(desk)/look-again/actions.ts';

/** A sent amendment as its builder names it: its id, and that of a remark on it. */
function amendmentOf(record: string): {
  readonly id: AmendmentId;
  readonly remark: string;
  readonly version: number;
  readonly key: string;
} {
  const [id = '', remark = record] = record.split(' ');
  return { id: id as AmendmentId, remark, version: 2, key: key() };
}

/** Nobody decides about their own; what was never sent is not there. */
const ofOthers = (other: string) => ({ own: 'own-amendment', other, none: 'not-found' });

const SIGNED_OUT = 'begins or ends a session; the use case decides by password or mailed link';
const BY_ADDRESS = 'whoever knows the address of 128 random bits may';
const PUBLIC_API = 'reads no cookie and knows no roles';

/** Every server action and every handler of a route. One that is added has no row here, and a test says so. */
export const DOORS: Readonly<Record<string, Door>> = {
  ...DRAFT_DOORS,
  'app/theme.ts chooseTheme': { open: 'a cookie of one’s own browser' },
  [`${ACCOUNT} beginAccount`]: { open: SIGNED_OUT },
  [`${ACCOUNT} enterByPassword`]: { open: SIGNED_OUT },
  [`${ACCOUNT} sendLink`]: { open: SIGNED_OUT },
  [`${ACCOUNT} sendReset`]: { open: SIGNED_OUT },
  [`${ACCOUNT} choosePassword`]: { open: SIGNED_OUT },
  [`${ACCOUNT} enterByLink`]: { open: SIGNED_OUT },
  [`${ACCOUNT} confirm`]: { open: SIGNED_OUT },
  [`${ACCOUNT} signOut`]: { open: SIGNED_OUT },
  [`${ACCOUNT} giveCode`]: {
    asks: 'account.give-second-factor',
    press: ({ ctx, session }) => giveSecondFactor(ctx, { key: key(), code: '000000' }, session, 'tests'),
    ends: { own: 'wrong-code' },
  },
  [`${ACCOUNT} typeAgain`]: {
    asks: 'account.sign-in-again',
    press: ({ ctx, session }) => signInAgain(ctx, { key: key(), password: 'not the password' }, session.id),
    ends: { own: 'wrong' },
  },
  [`${BENCH} confirmAgain`]: {
    asks: 'account.confirm-again',
    press: ({ ctx }) => mailConfirmationAgain(ctx, { key: key() }),
    ends: itself,
  },
  [`${BENCH} stay`]: { asks: 'account.stay', press: ({ ctx }) => keepAccount(ctx, { key: key() }), ends: itself },
  [`${BENCH} ask`]: { asks: 'role.ask', press: ({ ctx }) => askForRole(ctx, { key: key(), why: 'tests', regions: [] }), ends: itself },
  [`${BENCH} withdraw`]: {
    asks: 'role.withdraw',
    record: aRequest,
    press: ({ ctx }, id) => withdrawRoleRequest(ctx, { key: key(), id }),
    ends: theirsAlone,
  },
  [`${OWN} rename`]: { asks: 'account.rename', press: ({ ctx }) => renameAccount(ctx, { key: key(), name: 'Renamed' }), ends: itself },
  [`${OWN} changeAddress`]: {
    asks: 'account.change-address',
    press: ({ ctx }) => askAddressChange(ctx, { key: key(), email: `${key()}@example.test` as EmailAddress }),
    ends: itself,
  },
  [`${OWN} renewPassword`]: {
    asks: 'account.change-password',
    press: ({ ctx, session }) =>
      changePassword(ctx, { key: key(), current: 'not the password', password: 'a quite new sentence' }, session, 'tests'),
    ends: { own: 'wrong' },
  },
  [`${OWN} keepPreferences`]: {
    asks: 'account.set-preferences',
    press: ({ ctx }) => setOwnPreferences(ctx, { key: key(), region: null, currency: 'EUR', units: 'imperial' }),
    ends: itself,
  },
  [`${OWN} turnOn`]: {
    asks: 'account.set-second-factor',
    press: ({ ctx, session }) => turnOnSecondFactor(ctx, { key: key(), secret: 'MFRGGZDFMZTWQ2LK', code: '000000' }, session, 'tests'),
    ends: { own: 'wrong-code' },
  },
  [`${OWN} endSession`]: {
    asks: 'account.end-session',
    record: async (whose) => handleOf(await aSession(whose)),
    press: ({ ctx }, handle) => endOwnSession(ctx, { key: key(), handle: handle.replaceAll('-', '').slice(0, 16) }),
    ends: { own: 'ok', other: 'ok, nothing', none: 'ok, nothing' },
  },
  [`${OWN} endOthers`]: {
    asks: 'account.end-session',
    press: ({ ctx, session }) => endOtherSessions(ctx, session.id),
    ends: itself,
  },
  [`${OWN} putTogether`]: { asks: 'account.export', press: ({ ctx }) => beginExport(ctx, { key: key() }), ends: itself },
  [`${OWN} leave`]: { asks: 'account.leave', press: ({ ctx }) => leaveAccount(ctx, { key: key() }), ends: itself },
  [`${FACTOR} turnOff`]: {
    asks: 'account.set-second-factor',
    press: ({ ctx, session }) => turnOffSecondFactor(ctx, { key: key() }, session.id),
    ends: itself,
  },
  [`${FACTOR} renewCodes`]: { asks: 'account.set-second-factor', press: ({ ctx }) => renewRecoveryCodes(ctx), ends: itself },
  [`${DESK} giveRole`]: {
    asks: 'role.grant',
    record: (whose) => Promise.resolve(whose),
    press: ({ ctx, id: own }, id) =>
      changeRole(ctx, { key: key(), id: id as AccountId, from: id === own ? 'steward' : 'maker', role: 'editor', reason }),
    ends: { own: 'ok', other: 'ok', none: 'not-found' },
  },
  [`${DESK} close`]: {
    asks: 'account.close',
    record: (whose) => Promise.resolve(whose),
    press: ({ ctx }, id) => closeAccount(ctx, { key: key(), id: id as AccountId, reason }),
    ends: { own: 'own-account', other: 'ok', none: 'not-found' },
  },
  [`${DESK} reopen`]: {
    asks: 'account.close',
    record: () => anAccount({ state: 'closed' }),
    press: ({ ctx }, id) => reopenAccount(ctx, { key: key(), id: id as AccountId, reason }),
    ends: { own: 'ok', other: 'ok', none: 'not-found' },
  },
  [`${DESK} answer`]: {
    asks: 'role.answer',
    record: aRequest,
    press: ({ ctx }, id) => answerRequest(ctx, { key: key(), id, answer: 'refused', said: 'tests' }),
    ends: { own: 'ok', other: 'ok', none: 'not-found' },
  },
  [`${DESK} retry`]: {
    asks: 'outbox.retry',
    record: aParkedMail,
    press: ({ ctx }, id) => retryParked(ctx, { key: key(), what: 'mail', id }),
    ends: { own: 'ok', other: 'ok', none: 'not-parked' },
  },
  'app/(public)/rules/[id]/doubt/actions.ts raise': { open: 'anybody may doubt a rule; counted by address' },
  [`${DOUBTS} answer`]: {
    asks: 'doubt.answer',
    record: () => aDoubt(),
    press: ({ ctx }, id) => answerDoubt(ctx, { key: key(), id, answer: 'The order still stands.' }),
    ends: { other: 'ok', none: 'not-found' },
  },
  [`${DOUBTS} setAside`]: {
    asks: 'doubt.answer',
    record: () => aDoubt(),
    press: ({ ctx }, id) => setAsideDoubt(ctx, { key: key(), id, reason }),
    ends: { other: 'ok', none: 'not-found' },
  },
  [`${DOUBTS} takeUp`]: {
    asks: 'doubt.answer',
    record: aSetAside,
    press: ({ ctx }, id) => takeDoubtUp(ctx, { key: key(), id }),
    ends: { own: 'ok', other: 'ok', none: 'not-found' },
  },
  [`${KEEPING} become`]: {
    asks: 'sheet.keep',
    record: aDoubtedPlace,
    press: ({ ctx }, region) => becomeKeeper(ctx, { key: key(), region }),
    ends: { other: 'ok', none: 'not-found' },
  },
  [`${KEEPING} stop`]: {
    asks: 'sheet.keep',
    record: aKept,
    press: ({ ctx }, region) => stopKeeping(ctx, { key: key(), region }),
    ends: { own: 'ok', other: 'ok, nothing', none: 'ok, nothing' },
  },
  [`${TABLE} tick`]: {
    asks: 'amendment.judge',
    record: aSentAmendment,
    press: ({ ctx }, record) => {
      const { key: once, id, version } = amendmentOf(record);
      return tickClaim(ctx, { key: once, id, version, claim: 'rules/xa-mark#0', read: true });
    },
    ends: ofOthers('ok'),
  },
  [`${TABLE} remark`]: {
    asks: 'amendment.judge',
    record: aSentAmendment,
    press: ({ ctx }, record) => {
      const { key: once, id } = amendmentOf(record);
      return addRemark(ctx, { key: once, id, line: 'text', words: 'tests' });
    },
    ends: ofOthers('ok'),
  },
  [`${TABLE} answer`]: {
    // Its author answers too, as an editor: the tie to the amendment is tried in tests/db/amendments.test.ts.
    asks: 'amendment.write',
    record: aSentAmendment,
    press: ({ ctx }, record) => {
      const { key: once, id, remark } = amendmentOf(record);
      return answerRemark(ctx, { key: once, id, remark, words: 'tests' });
    },
    ends: { own: 'ok', none: 'not-found' },
  },
  [`${TABLE} mark`]: {
    asks: 'amendment.judge',
    record: aSentAmendment,
    press: ({ ctx }, record) => {
      const { key: once, id, remark } = amendmentOf(record);
      return markRemark(ctx, { key: once, id, remark, answered: true });
    },
    ends: ofOthers('ok'),
  },
  [`${TABLE} hold`]: {
    asks: 'amendment.judge',
    record: aSentAmendment,
    press: ({ ctx }, record) => {
      const { key: once, id, version } = amendmentOf(record);
      return holdAmendment(ctx, { key: once, id, version, reason });
    },
    ends: ofOthers('ok'),
  },
  [`${TABLE} release`]: {
    asks: 'amendment.judge',
    record: aSentAmendment,
    press: ({ ctx }, record) => {
      const { key: once, id, version } = amendmentOf(record);
      return releaseAmendment(ctx, { key: once, id, version });
    },
    ends: ofOthers('already-decided'),
  },
  [`${TABLE} sendBack`]: {
    asks: 'amendment.judge',
    record: aSentAmendment,
    press: ({ ctx }, record) => {
      const { key: once, id, version } = amendmentOf(record);
      return sendBackAmendment(ctx, { key: once, id, version, reason });
    },
    ends: ofOthers('ok'),
  },
  ...Object.fromEntries(
    ['approve', 'giveBack'].map((name) => [
      `${TABLE} ${name}`,
      {
        asks: 'amendment.judge' as const,
        record: aSentAmendment,
        press: ({ ctx }: Presser, record: string) => {
          const { key: once, id, version } = amendmentOf(record);
          return approveAmendment(ctx, { key: once, id, version });
        },
        ends: ofOthers('not-all-read'),
      },
    ]),
  ),
  'app/api/sorting-table/route.ts GET': {
    asks: 'amendment.judge',
    press: ({ ctx }) => waitingStamp(ctx, {}),
    ends: { own: 'ok, nothing' },
  },
  'app/(public)/regions/[code]/editions/withdraw/actions.ts withdraw': {
    asks: 'edition.withdraw',
    press: ({ ctx }) => withdrawEdition(ctx, { key: key(), region: 'zz', number: 2, reason }),
    ends: { own: 'not-found' },
  },
  'app/(public)/readings/actions.ts keepReadings': { open: BY_ADDRESS },
  'app/(public)/regions/wishes/actions.ts wish': { open: 'anybody may ask for a region; counted by address' },
  [`${CHECK} begin`]: { open: BY_ADDRESS },
  [`${CHECK} place`]: { open: BY_ADDRESS },
  [`${CHECK} answer`]: { open: BY_ADDRESS },
  [`${CHECK} show`]: { open: BY_ADDRESS },
  [`${CHECK} keepCopy`]: { open: BY_ADDRESS },
  'app/(account)/too-many/route.ts GET': { open: 'words alone' },
  'app/(workshop)/bench/account/export/[archive]/route.ts GET': {
    asks: 'account.export',
    record: anArchive,
    press: ({ ctx }, id) => readArchive(ctx, id),
    ends: { own: 'ok, nothing', other: 'not-found', none: 'not-found' },
  },
  'app/api/files/route.ts POST': {
    asks: 'file.keep',
    press: ({ ctx }) => keepPageSeen(ctx, { key: key(), name: 'page.txt', body: [Buffer.from('tests')], declaredBytes: 5 }),
    ends: itself,
  },
  'app/api/files/[id]/route.ts GET': {
    // Whose file an editor, a moderator may read besides their own is tried in tests/db/files.test.ts.
    asks: 'file.read',
    record: async (whose) => (await aKeptFile(whose)).id,
    press: ({ ctx }, id) => readFile(ctx, id as FileId),
    ends: { own: 'ok, nothing', none: 'not-found' },
  },
  'app/api/health/route.ts GET': { open: PUBLIC_API },
  'app/api/v1/checks/route.ts POST': { open: PUBLIC_API },
  'app/api/v1/checks/route.ts OPTIONS': { open: PUBLIC_API },
  'app/api/v1/verdicts/route.ts POST': { open: PUBLIC_API },
  'app/api/v1/verdicts/route.ts OPTIONS': { open: PUBLIC_API },
  'app/api/v1/regions/route.ts GET': { open: PUBLIC_API },
  'app/api/v1/regions/route.ts OPTIONS': { open: PUBLIC_API },
  'app/api/v1/regions/[code]/route.ts GET': { open: PUBLIC_API },
  'app/api/v1/regions/[code]/route.ts OPTIONS': { open: PUBLIC_API },
  'app/api/v1/regions/[code]/editions/route.ts GET': { open: PUBLIC_API },
  'app/api/v1/regions/[code]/editions/route.ts OPTIONS': { open: PUBLIC_API },
  'app/api/v1/rules/[id]/route.ts GET': { open: PUBLIC_API },
  'app/api/v1/rules/[id]/route.ts OPTIONS': { open: PUBLIC_API },
  'app/api/v1/notes/route.ts GET': { open: PUBLIC_API },
  'app/api/v1/notes/route.ts OPTIONS': { open: PUBLIC_API },
  'app/api/v1/search-index/route.ts GET': { open: PUBLIC_API },
  'app/api/v1/search-index/route.ts OPTIONS': { open: PUBLIC_API },
  'app/api/v1/search/route.ts GET': { open: PUBLIC_API },
  'app/api/v1/search/route.ts OPTIONS': { open: PUBLIC_API },
};
