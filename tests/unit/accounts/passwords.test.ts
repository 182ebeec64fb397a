import { describe, expect, test } from 'vitest';
import { passwordFault, readPassword } from '@/lib/accounts/domain/password-rules';
import { commonPasswords } from '@/lib/server/password';

const OWN = ['Mara Lindqvist', 'mara@example.test'];
const fault = (password: string): string | null => passwordFault(readPassword(password), commonPasswords(), OWN);

describe('ACT-3 S13 a new password', () => {
  test.each([
    ['1234567', 'too-short'],
    ['🏺🏺🏺🏺', 'too-short'],
    ['password', 'common'],
    ['PassWord', 'common'],
    ['12345678', 'common'],
    ['qwertyuiop', 'common'],
    ['1qaz2wsx', 'common'],
    ['ｐａｓｓｗｏｒｄ', 'common'],
    ['mara lindqvist', 'own-words'],
    ['Mara@example.test', 'own-words'],
    ['a'.repeat(1001), 'too-long'],
  ])('%j is refused: %s', (password, why) => {
    expect(fault(password)).toBe(why);
  });

  test.each([
    'tunnelki',
    'kkkkkkkkkkkkkkkkkkkkkkk',
    '        x',
    'slow wheel, wet hands',
    '窯の火は静かに燃える',
    'a'.repeat(64),
    'a'.repeat(1000),
  ])('%j is taken', (password) => {
    expect(fault(password)).toBeNull();
  });

  test('three thousand of those most used, long enough to be asked about, are refused', () => {
    expect(commonPasswords().size).toBe(3000);
    expect([...commonPasswords()].filter((word) => word.length < 8 || word !== word.toLowerCase())).toEqual([]);
  });
});
