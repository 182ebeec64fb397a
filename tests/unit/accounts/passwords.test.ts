import type * as Argon from '@node-rs/argon2';
import { describe, expect, test, vi } from 'vitest';
import { passwordFault, readPassword } from '@/lib/accounts/domain/password-rules';
import { commonPasswords, hashPassword, isPassword } from '@/lib/server/password';

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

const hashing = vi.hoisted(() => ({ now: 0, most: 0, all: 0 }));

vi.mock('@node-rs/argon2', async (original) => {
  const real = await original<typeof Argon>();
  const counted = async <T>(work: () => Promise<T>): Promise<T> => {
    hashing.now += 1;
    hashing.all += 1;
    hashing.most = Math.max(hashing.most, hashing.now);
    try {
      return await work();
    } finally {
      hashing.now -= 1;
    }
  };
  return {
    ...real,
    hash: (...given: Parameters<typeof real.hash>) => counted(() => real.hash(...given)),
    verify: (...given: Parameters<typeof real.verify>) => counted(() => real.verify(...given)),
  };
});

test('S12 of twenty passwords looked at together no more than two are hashed at once, and all come to their end', async () => {
  const kept = await hashPassword('slow wheel, wet hands');
  expect(kept).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
  const asked = Array.from({ length: 20 }, (_, at) =>
    isPassword(at % 4 === 3 ? null : kept, at % 4 === 0 ? 'slow wheel, wet hands' : 'wrong'),
  );
  expect((await Promise.all(asked)).filter(Boolean)).toHaveLength(5);
  expect([hashing.most, hashing.now]).toEqual([2, 0]);
  expect(hashing.all).toBeGreaterThanOrEqual(22); // the first hash, the decoy, twenty looks
});
