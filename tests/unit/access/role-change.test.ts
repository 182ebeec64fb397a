import { expect, test } from 'vitest';
import { rankOf, type AccountRole } from '@/lib/access/domain/actor';
import { ACCOUNT_STATES } from '@/lib/accounts/domain/account';
import { namesPerson } from '@/lib/accounts/domain/public-reason';
import { judgeClosing, judgeRoleChange } from '@/lib/accounts/domain/role-change';
import { accountId } from '@/lib/accounts/schema';
import { err, ok } from '@/lib/kernel/result';

const ONE = accountId.parse('0193b0c4-8a00-7000-8000-000000000001');
const OTHER = accountId.parse('0193b0c4-8a00-7000-8000-000000000002');
const ALL = ['maker', 'editor', 'moderator', 'steward'] as const;
const cube = ALL.flatMap((by) => ALL.flatMap((from) => ALL.map((to) => [by, from, to] as const)));

test.each(cube)('ROL-2 S30 a %s over somebody who is a %s: to a %s', (by, from, to) => {
  const answer = judgeRoleChange(by, { id: ONE, role: from, state: 'open' }, { from, to }, 5);
  const reaches = [from, to].every((role) => rankOf(role) <= rankOf(by));
  const expected =
    from === to ? err({ kind: 'same-role' }) : !reaches ? err({ kind: 'too-high' }) : ok(rankOf(to) > rankOf(from) ? 'grant' : 'take');
  expect(answer).toEqual(expected);
});

test('ROL-2 who cannot sign in gets no higher role, but can lose one', () => {
  for (const state of ACCOUNT_STATES.filter((one) => one !== 'open')) {
    const change = (from: AccountRole, to: AccountRole) => judgeRoleChange('steward', { id: ONE, role: from, state }, { from, to }, 5);
    expect([state, change('maker', 'editor'), change('editor', 'maker')]).toEqual([state, err({ kind: 'not-open' }), ok('take')]);
  }
});

test('ROL-3 S30 the last steward keeps the role and the account, one of two does not have to', () => {
  const holder = { id: ONE, role: 'steward', state: 'open' } as const;
  const by = { id: OTHER, role: 'steward' } as const;
  for (const to of ['maker', 'editor', 'moderator'] as const) {
    expect(judgeRoleChange('steward', holder, { from: 'steward', to }, 1)).toEqual(err({ kind: 'last-steward' }));
    expect(judgeRoleChange('steward', holder, { from: 'steward', to }, 2)).toEqual(ok('take'));
  }
  expect(judgeClosing(by, holder, 1)).toEqual(err({ kind: 'last-steward' }));
  expect(judgeClosing(by, holder, 2)).toEqual(ok(null));
  expect(judgeClosing({ id: OTHER, role: 'moderator' }, holder, 2)).toEqual(err({ kind: 'too-high' }));
});

test.each([
  ['Mira Veld asked for it', true],
  ['asked for by MIRA   VELD', true],
  ['Míra Veld asked for it', false],
  ['Mira asked for it', false],
  ['Write to m.veld@example.test', true],
  ['Price: 3 @ 5 kr', false],
  ['Sent three amendments that hold', false],
])('ROL-7 a reason "%s" names Mira Veld: %s', (reason, names) => {
  expect(namesPerson(reason, 'Mira Veld')).toBe(names);
});

test('ROL-7 a short name is found as a word, not inside one, and a name without letters never', () => {
  expect([namesPerson('all of it', 'Al'), namesPerson('told by Al.', 'Al'), namesPerson('told by nobody', '☕')]).toEqual([
    false,
    true,
    false,
  ]);
});
