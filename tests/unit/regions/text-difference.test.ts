import fc from 'fast-check';
import { expect, test } from 'vitest';
import { MOST_CHARACTERS, passagesIn, sideOf, textDifference, type Passage } from '@/lib/regions/domain/text-difference';

const read = (passages: readonly Passage[]): readonly string[] =>
  passages.map((passage) => (passage.kind === 'changed' ? passage.parts.map(({ text }) => text).join('') : passage.text));

const changed = (before: string, after: string): readonly Passage[] => {
  const difference = textDifference(before, after);
  return difference.kind === 'changed' ? difference.passages : [];
};

const words = fc.constantFrom(
  'lead',
  'cadmium',
  'The',
  'piece',
  'bowl,',
  '25 mm.',
  'rim',
  'Is',
  'it?',
  '*mark*',
  '- ',
  '## ',
  '\n',
  '\n\n',
  '4 mg/L',
  'å',
);
const texts = fc.array(words, { maxLength: 60 }).map((list) => list.join(' '));

test('REG-32 applying a difference gives the newer text, undoing it the older one, whatever the texts', () => {
  fc.assert(
    fc.property(texts, texts, (before, after) => {
      const difference = textDifference(before, after);
      if (difference.kind !== 'changed') {
        expect(passagesIn(before)).toEqual(passagesIn(after));
        return;
      }
      expect(read(sideOf(difference.passages, 'after'))).toEqual(passagesIn(after));
      expect(read(sideOf(difference.passages, 'before'))).toEqual(passagesIn(before));
    }),
    { numRuns: 2000, seed: 20_261_201 },
  );
});

test('REG-32 line breaks, blank lines and list marks are layout', () => {
  const before = 'Keep the lead low.\nTest one piece.\n\n\n- bowls\n- plates\n';
  const after = 'Keep the lead low. Test\none piece.\n\n* bowls\n\n* plates';
  expect(textDifference(before, after)).toEqual({ kind: 'layout' });
  expect(textDifference(before, before)).toEqual({ kind: 'same' });
  // A line of its own is a passage of its own.
  expect(textDifference('One. Two.', 'One.\n\nTwo.').kind).toBe('changed');
});

test('REG-33 in a changed sentence only the other words are marked, and neighbouring sentences stay', () => {
  const [passage] = changed(
    'Test one piece. Keep the lead to at most 4 mg/L. Ask the lab.',
    'Test one piece. Keep the lead to at most 2 mg/L. Ask the lab.',
  );
  expect(passage).toEqual({
    kind: 'changed',
    parts: [
      { kind: 'kept', text: 'Test one piece. Keep the lead to at most ' },
      { kind: 'removed', text: '4' },
      { kind: 'added', text: '2' },
      { kind: 'kept', text: ' mg/L. Ask the lab.' },
    ],
  });
});

test('REG-33 changes with only a space between them are told as one', () => {
  const [passage] = changed('Ask the town office about the fee.', 'Ask our food authority about the fee.');
  expect(passage).toMatchObject({
    parts: [{ text: 'Ask ' }, { kind: 'removed', text: 'the town office' }, { kind: 'added' }, { kind: 'kept' }],
  });
});

test('REG-33 a paragraph in another place is moved, not changed', () => {
  const before = 'First of all the rim.\n\nThen the inside.\n\nLast the foot ring of it.';
  const after = 'Then the inside.\n\nLast the foot ring of it.\n\nFirst of all the rim.';
  expect(changed(before, after).map(({ kind }) => kind)).toEqual(['moved-away', 'kept', 'kept', 'moved']);
});

test('REG-33 a sentence that has nothing in common is taken out and put in whole', () => {
  expect(changed('Crazed glaze harbours dirt.', 'Write to us before you ship.').map(({ kind }) => kind)).toEqual(['added', 'removed']);
});

test('REG-32 a text beyond the limit is not compared', () => {
  expect(textDifference('a'.repeat(MOST_CHARACTERS + 1), 'b')).toEqual({ kind: 'too-long' });
});
