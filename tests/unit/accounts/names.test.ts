import { describe, expect, test } from 'vitest';
import { nameFault, tidyName } from '@/lib/accounts/domain/person-name';

describe('ACT-2 a name', () => {
  test.each([
    ['  Mara   Lindqvist ', 'Mara Lindqvist'],
    ['Mara\u202eLindqvist', 'Mara Lindqvist'],
    ['Ma\u200bra', 'Ma ra'],
    ['Mara\r\nBcc: x', 'Mara Bcc: x'],
    ['Ine\u0302s', 'In\u00eas'],
    ['石森', '石森'],
    ["O'Brien-Ağaoğlu", "O'Brien-Ağaoğlu"],
    ['\u3164', ''],
    ['\u2800', ''],
  ])('%j is kept as %j', (typed, kept) => {
    expect(tidyName(typed)).toBe(kept);
  });

  test.each(['Footring', 'FOOTRING', 'fооtring', 'F00tring', 'Stéward', 'steward', 'Ѕteward', 'A former editor', 'admin', 'ADMIN'])(
    '%j reads as if the site were speaking',
    (typed) => {
      expect(nameFault(tidyName(typed))).toBe('reserved');
    },
  );

  test('is neither empty nor longer than 80', () => {
    expect(nameFault(tidyName(' \u200b '))).toBe('empty');
    expect(nameFault('a'.repeat(80))).toBeNull();
    expect(nameFault('a'.repeat(81))).toBe('too-long');
  });
});
