import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, test } from 'vitest';
import { SectionDrawing } from '@/components/pieces/section-drawing';
import { sectionWords, type PieceShape } from '@/components/pieces/section-words';
import { StateMark, type State } from '@/components/checks/state-mark';
import { FootRingMark } from '@/components/site/foot-ring-mark';

const drawn = (piece: PieceShape): string => renderToStaticMarkup(<SectionDrawing {...piece} words={sectionWords(piece)} />);

describe('section drawing', () => {
  test('W2 its title and description say what it shows', () => {
    const piece: PieceShape = { form: 'bowl', depthMm: 62, inside: 'unglazed' };
    expect(sectionWords(piece).title).toBe('Bowl, 62\u00a0mm deep inside, inside unglazed');
    expect(drawn(piece)).toMatch(/role="img" aria-labelledby="(\S+) (\S+)"><title id="\1">Bowl, 62/u);
  });

  test('everything known is in the words too', () => {
    const { about, key } = sectionWords({
      form: 'jar',
      capacityMl: 1100.5,
      inside: 'glazed',
      crazed: true,
      rimDecorated: true,
      lidded: true,
    });
    expect(about).toContain(
      'Holds 1,100.5\u00a0mL to the brim, the glaze inside is crazed, decorated outside within 20\u00a0mm of the rim, with a lid.',
    );
    expect(key).toHaveLength(4);
  });

  test('an unknown form says so, in the drawing and in its title', () => {
    expect(drawn({})).toContain('form not known yet');
    expect(sectionWords({}).title).toBe('Form not known yet');
    expect(sectionWords({ form: 'spaceship' }).title).toBe('Form not known yet');
  });

  test.each([
    ['dots', { form: 'bowl', inside: 'unglazed' }],
    ['net', { form: 'bowl', inside: 'glazed', crazed: true }],
  ] as const)('%s mark what the surface is', (pattern, piece) => {
    expect(drawn(piece)).toMatch(new RegExp(`stroke="url\\(#[^)]*${pattern}\\)"`));
    expect(drawn({ form: 'bowl', inside: 'glazed' })).not.toContain('stroke="url(');
  });

  test('bare clay shows no crazing, whatever was answered before', () => {
    expect(drawn({ form: 'bowl', inside: 'unglazed', crazed: true })).not.toMatch(/stroke="url\(#[^)]*net\)"/);
  });

  test('two drawings on a page do not share their patterns', () => {
    const two = renderToStaticMarkup(
      <>
        <SectionDrawing form="bowl" words={sectionWords({})} />
        <SectionDrawing form="mug" words={sectionWords({})} />
      </>,
    );
    const ids = [...two.matchAll(/ id="([^"]+)"/g)].map(([, id]) => id);
    expect(new Set(ids).size).toBe(ids.length);
  });

  test('no form and no measure makes a drawing break', () => {
    for (const form of ['plate', 'teapot', 'tile', 'ornament', 'other', undefined]) {
      expect(drawn({ form, depthMm: 0.001, capacityMl: 1e9, lidded: true, inside: 'partly-glazed', crazed: true })).not.toMatch(
        /NaN|Infinity/,
      );
    }
  });
});

test('W5 each state has a word and a mark whose shape is its own', () => {
  const states: readonly State[] = ['applies', 'not-settled', 'treat-as-applying', 'does-not-apply', 'sources-disagree', 'withdrawn'];
  const marks = states.map((state) => renderToStaticMarkup(<StateMark state={state} />));
  expect(new Set(marks.map((mark) => /<svg[^>]*>(.*)<\/svg>/.exec(mark)?.[1])).size).toBe(states.length);
  expect(marks.map((mark) => mark.replace(/<[^>]*>/g, ''))).toEqual([
    'Applies',
    'Not settled yet',
    'Treat as applying',
    'Does not apply',
    'Sources disagree',
    'Withdrawn',
  ]);
});

test('the foot-ring mark has one inner ring a layer, and always its spiral', () => {
  const counts = ([1, 2, 3] as const).map((rings) => {
    const mark = renderToStaticMarkup(<FootRingMark size={120} rings={rings} />);
    return [mark.match(/<circle/g)?.length, mark.match(/<path/g)?.length];
  });
  expect(counts).toEqual([
    [2, 2],
    [3, 2],
    [4, 2],
  ]);
});
