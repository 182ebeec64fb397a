import { describe, expect, test } from 'vitest';
import { renameInput } from '@/lib/accounts/schema';

const key = '0190a000-0000-7000-8000-000000000001';
const keptAs = (name: string): string | null => {
  const read = renameInput.safeParse({ key, name });
  return read.success ? read.data.name : null;
};

/** What is typed, and what is kept of it; null: it is refused. */
const NAMES: readonly (readonly [typed: string, kept: string | null])[] = [
  ['Mara Lindqvist', 'Mara Lindqvist'],
  ['Zoe\u0308 Brandt', 'Zo\u00eb Brandt'],
  ['\u212bsa Berg', '\u00c5sa Berg'],
  ['石森 まり', '石森 まり'],
  ['Αγγελική', 'Αγγελική'],
  ['محمد علي', 'محمد علي'],
  ["D'Arcy O’Neill-Ferreira", "D'Arcy O’Neill-Ferreira"],
  ['Potter no. 7', 'Potter no. 7'],
  ['🏺 Ines', '🏺 Ines'],
  ['Stewart', 'Stewart'],
  ['Modesta Rator', 'Modesta Rator'],
  ['  Ines \t Duarte  ', 'Ines Duarte'],
  ['Ines\u00a0\u2003Duarte', 'Ines Duarte'],
  ['Ines\r\nBcc: x@example.test', 'Ines Bcc: x@example.test'],
  ['Ines\u2028Duarte', 'Ines Duarte'],
  ['Ines\u0000Duarte', 'Ines Duarte'],
  ['Ines\u001b[31m', 'Ines [31m'],
  ['Ines\u007f', 'Ines'],
  ['\u202eetraud senI', 'etraud senI'],
  ['Ines \u202aDuarte\u202c', 'Ines Duarte'],
  ['Ines \u2066Duarte\u2069', 'Ines Duarte'],
  ['\u200fInes\u200e', 'Ines'],
  ['In\u200bes', 'In es'],
  ['In\u200des', 'In es'],
  ['In\ufeffes', 'In es'],
  ['In\u00ades', 'In es'],
  ['In\u2060es', 'In es'],
  ['Ines\ud800', 'Ines'],
  ['Ines\ue000', 'Ines'],
  ['\u3164', null],
  ['\u2800\u115f', null],
  [' \u200b\u202e ', null],
  ['', null],
  ['a'.repeat(81), null],
  ['Footring', null],
  ['F\u043e\u043etring', null],
  ['foot\u200bring', 'foot ring'],
  ['ＦＯＯＴＲＩＮＧ', null],
  ['St\u0435ward', null],
  ['  A   Former\u00a0Editor ', null],
  ['m0derator', null],
  ['\ud835\udcae\ud835\udcc9\ud835\udc52\ud835\udccc\ud835\udcb6\ud835\udcc7\ud835\udcb9', null],
  ['<script>__fired++</script>', '<script>__fired++</script>'],
];

describe('ACT-2 S41 a name', () => {
  test('of the table is one of forty at least, each once', () => {
    expect(new Set(NAMES.map(([typed]) => typed)).size).toBeGreaterThanOrEqual(40);
  });

  test.each(NAMES)('%j is kept as %j', (typed, kept) => {
    expect(keptAs(typed)).toBe(kept);
    if (kept !== null) expect(keptAs(kept)).toBe(kept);
  });
});
