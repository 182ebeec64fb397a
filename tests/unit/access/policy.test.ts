import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { ROLES, type AccountId, type AccountRole, type Actor, type SignedIn } from '@/lib/access/domain/actor';
import { can, DELICATE, mayNow, NEEDS_CONFIRMED, POLICY, wantsSecondFactor, type Action } from '@/lib/access/domain/policy';

const NOW = new Date('2026-12-01T10:00:00Z');
const soon = new Date('2026-12-01T10:05:00Z');
const READER: Actor = { kind: 'reader' };

const anActor = (role: AccountRole, more: Partial<SignedIn> = {}): SignedIn => ({
  kind: 'account',
  id: '0190a000-0000-7000-8000-000000000001' as AccountId,
  role,
  name: 'Mara Lindqvist',
  confirmed: true,
  secondFactor: 'given',
  freshUntil: soon,
  ...more,
});

const ACTIONS = Object.keys(POLICY) as Action[];
const action = fc.constantFrom(...ACTIONS);
const role = fc.constantFrom(...ROLES.filter((one): one is AccountRole => one !== 'reader'));
const kindOf = (actor: Actor, asked: Action, now = NOW): string => {
  const may = mayNow(actor, asked, now);
  return may.ok ? 'ok' : may.error.kind;
};

test('ACC-1 roles add up: what a role may, every higher one may', () => {
  const notAddedUp = ACTIONS.filter(
    (asked) => asked !== 'role.ask' && ROLES.slice(ROLES.indexOf(POLICY[asked][0] ?? 'steward')).join() !== POLICY[asked].join(),
  );
  expect(notAddedUp).toEqual([]);
  expect(POLICY['role.ask']).toEqual(['maker']);
});

test('ACC-2 while the second factor is owed, only giving it and what anybody may is open', () => {
  const waiting = (of: AccountRole): SignedIn => anActor(of, { secondFactor: 'waiting' });
  fc.assert(
    fc.property(role, action, (of, asked) => {
      const open = asked === 'account.give-second-factor' || can(READER, asked);
      const said = kindOf(waiting(of), asked);
      expect(said === 'ok').toBe(open);
      if (!open) expect(['second-factor-needed', 'not-allowed']).toContain(said);
    }),
    { seed: 2 },
  );
});

describe('ACC-3 what needs a moderator or a steward', () => {
  const theirs = ACTIONS.filter(wantsSecondFactor);

  test('is something', () => {
    expect(theirs).toContain('role.grant');
  });

  test.each(theirs)('%s needs a second factor given and a confirmed address', (asked) => {
    expect(kindOf(anActor('steward'), asked)).toBe('ok');
    expect(kindOf(anActor('steward', { secondFactor: 'off' }), asked)).toBe('second-factor-needed');
    expect(kindOf(anActor('steward', { confirmed: false }), asked)).toBe('confirm-first');
  });
});

test('ACC-4 S18 delicate acts ask for the password again after ten minutes', () => {
  for (const asked of DELICATE) {
    const highest = anActor('steward', { freshUntil: NOW });
    expect([asked, kindOf(highest, asked, new Date(NOW.getTime() - 1)), kindOf(highest, asked, NOW)]).toEqual([
      asked,
      'ok',
      'sign-in-again',
    ]);
  }
  expect([...DELICATE]).toEqual(expect.arrayContaining(['role.grant', 'account.change-address', 'account.export', 'account.close']));
});

test('ACC-5 a reader is led to sign in, a role too low is told no', () => {
  expect(kindOf(READER, 'account.rename')).toBe('sign-in');
  expect(kindOf(READER, 'account.sign-up')).toBe('ok');
  expect(kindOf(anActor('moderator'), 'role.grant')).toBe('not-allowed');
  for (const asked of NEEDS_CONFIRMED) {
    const lowest = ROLES.find((one): one is AccountRole => one !== 'reader' && POLICY[asked].includes(one)) ?? 'steward';
    expect([asked, kindOf(anActor(lowest, { confirmed: false }), asked)]).toEqual([asked, 'confirm-first']);
  }
});
