import { expect, test } from 'vitest';
import { sayLine } from '@/components/day-book/line-words';
import { ROLES, type AccountRole } from '@/lib/access/domain/actor';
import { ACCOUNT_STATES } from '@/lib/accounts/domain/account';
import type { DayBookEntry } from '@/lib/day-book/domain/entry';
import { ACTS } from '@/lib/day-book/domain/kinds';
import { tellLine, type Person } from '@/lib/day-book/domain/told-line';

const aLine = (over: Partial<DayBookEntry>): DayBookEntry => ({
  number: 7,
  at: new Date('2026-12-01T10:00:00Z'),
  actorId: 'actor',
  did: 'role.grant',
  subject: { kind: 'account', id: 'subject' },
  reason: 'Knows the Danish rules.',
  details: { from: 'maker', to: 'editor' },
  ...over,
});

const people = (subject: Partial<Person>, actor: Partial<Person> = {}): ReadonlyMap<string, Person> =>
  new Map([
    ['actor', { id: 'actor', name: 'Tomasz Wierzba', role: 'steward', state: 'open', ...actor }],
    ['subject', { id: 'subject', name: 'Mira Veld', role: 'editor', state: 'open', ...subject }],
  ]);

const said = (line: DayBookEntry, known: ReadonlyMap<string, Person>): string => sayLine(tellLine(line, known));

test('DAY-8 an editor is called by the name of today, the steward by the role', () => {
  expect(said(aLine({}), people({}))).toBe('A steward made Mira Veld an editor; before: a maker.');
});

test('DAY-8 no line ever names a maker, a steward who acted, or anybody whose account is not open', () => {
  const roles = ROLES.filter((role): role is AccountRole => role !== 'reader');
  for (const did of [...Object.values(ACTS).flat(), 'edition.approve']) {
    for (const role of roles) {
      for (const state of ACCOUNT_STATES) {
        for (const details of [{ from: 'maker', to: 'editor' }, {}, null]) {
          const text = said(aLine({ did, details }), people({ role, state }));
          const mayBeNamed = role !== 'maker' && (state === 'open' || state === 'leaving');
          if (!mayBeNamed) expect([did, role, state, text.includes('Mira')]).toEqual([did, role, state, false]);
          if (did !== 'edition.approve') expect([did, text.includes('Tomasz')]).toEqual([did, false]);
        }
      }
    }
  }
});

test('DAY-8 an act of another kind is told with whoever did it, and one of the site as its own', () => {
  const approve = aLine({ did: 'edition.approve', details: {} });
  expect(said(approve, people({}, { role: 'moderator', name: 'Ruth Abercorn' }))).toBe('Ruth Abercorn did this: edition.approve.');
  expect(said(approve, people({}, { role: 'maker' }))).toBe('A former editor did this: edition.approve.');
  expect(said(aLine({ actorId: null }), people({}))).toBe('The site made Mira Veld an editor; before: a maker.');
  expect(said(aLine({}), new Map())).toBe('A steward made a former editor an editor; before: a maker.');
});
