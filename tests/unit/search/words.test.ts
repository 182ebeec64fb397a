import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { allOf } from '@/lib/search/domain/full-text';
import { indexWords } from '@/lib/search/domain/index-words';
import { compoundOf, meaningsOf } from '@/lib/search/domain/lexicon';
import { matchedSentence } from '@/lib/search/domain/matched-sentence';
import { readQuery } from '@/lib/search/domain/query';
import { readWords } from '@/lib/search/domain/read-words';
import { stem } from '@/lib/search/domain/stem';
import { makeVocabulary } from '@/lib/search/domain/vocabulary';

const vocabulary = makeVocabulary(
  ['spinach', 'crazing', 'kettle', 'absorption'].map((word) => ({ word, uses: 3 })),
  [
    { code: 'dk', names: ['Denmark', 'dk'] },
    { code: 'us', names: ['United States', 'us'] },
    { code: 'in', names: ['India', 'in'] },
  ],
);
const meaning = (text: string) => meaningsOf(readWords(text)).map(({ concept }) => concept.id);

describe('SRCH-7', () => {
  test.each([
    ['glaze', 'glazes', 'glazed', 'glazing'],
    ['colour', 'color', 'colours', 'coloured'],
    ['litre', 'liter', 'litres'],
    ['oxidise', 'oxidize', 'oxidised'],
    ['label', 'labels', 'labelled', 'labeling', 'labelling'],
    ['dish', 'dishes'],
    ['body', 'bodies'],
    ['aluminium', 'aluminum'],
    ['grey', 'gray'],
  ])('SRCH-7 forms of %s are read alike', (...forms) => {
    expect(new Set(forms.map(stem)).size).toBe(1);
  });

  test('SRCH-7 words that differ stay apart', () => {
    expect(new Set(['lead', 'leach', 'lid', 'lip', 'glass', 'glaze', 'grass', 'test', 'rim'].map(stem)).size).toBe(9);
  });

  test.each(['Haarrisse', 'HAARRISSE', 'crackle lines', 'Craze-Lines', 'krakelering', 'tressaillage', 'Craquelé', 'craquele'])(
    'SRCH-7 %s means crazing',
    (said) => {
      expect(meaning(said)).toEqual(['crazing']);
    },
  );

  test('SRCH-7 compounds are taken apart', () => {
    expect(compoundOf('bleiglasur').map(({ id }) => id)).toEqual(['lead', 'glaze']);
    expect(compoundOf('blyglasur').map(({ id }) => id)).toEqual(['lead', 'glaze']);
    expect(compoundOf('kettledrum')).toEqual([]);
  });
});

describe('a question', () => {
  test('is mended where a word has a slip, and says so', () => {
    expect(readQuery('crazng', vocabulary).mended).toEqual([{ from: 'crazng', to: 'crazing' }]);
    expect(readQuery('spinahc', vocabulary).read).toBe('spinach');
  });

  test('keeps a word that stands in some text, however odd', () => {
    expect(readQuery('kettle', vocabulary).mended).toEqual([]);
  });

  test('sets places apart, by their nicknames too, and leaves "in" a plain word', () => {
    expect(readQuery('lead in Denmark', vocabulary).places).toEqual(['dk']);
    expect(readQuery('lead in the states', vocabulary).places).toEqual(['us']);
  });

  test('names what nothing comes near to', () => {
    expect(readQuery('qqqqxxxx', vocabulary).unknown).toEqual(['qqqqxxxx']);
  });
});

test('SRCH-3 no mark of the query language comes through from a question', () => {
  fc.assert(
    fc.property(
      fc.oneof(fc.string(), fc.string({ unit: fc.constantFrom('+', '-', '*', '"', '(', ')', '~', '<', '>', '@', 'a', 'glaze', ' ') })),
      (asked) => {
        expect(allOf(readQuery(asked, vocabulary).sought)).toMatch(/^(?:\+(?:\((?:[\p{L}\p{N}_]+\*? ?)+\)|[\p{L}\p{N}_]+\*?) ?)*$/u);
      },
    ),
  );
});

test('SRCH-6 the sentence is a part of the text, and each mark has what was sought', () => {
  const words = fc.constantFrom('crazing', 'lets', 'liquid', 'through', 'glaze', 'Haarrisse', 'é', '.', '?', '\n', 'lead', '—', 'ß');
  fc.assert(
    fc.property(fc.array(words, { maxLength: 120 }), fc.constantFrom('crazing', 'lead glaze', 'liquid'), (parts, asked) => {
      const text = parts.join(' ');
      const { sought } = readQuery(asked, vocabulary);
      const shown = matchedSentence(text, sought);
      const plain = shown
        .map((part) => part.text)
        .join('')
        .replace(/^… |…$/g, '');
      expect(text).toContain(plain.trimEnd());
      for (const { text: met } of shown.filter(({ isMet }) => isMet)) {
        const own = indexWords(met);
        expect(sought.some(({ tokens }) => tokens.some((token) => own.includes(token)))).toBe(true);
      }
    }),
  );
});
