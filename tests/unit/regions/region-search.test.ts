import { describe, expect, test } from 'vitest';
import type { ListedRegion } from '@/lib/regions/domain/listed-region';
import { foldText, nearestRegions, searchRegions } from '@/lib/regions/domain/region-search';

const place = (code: string, name: string, line: readonly string[] = [code]): ListedRegion => ({
  code,
  name,
  line,
  kind: 'country',
  edition: 1,
  limits: 'read',
});

const PLACES = [
  place('eu', 'European Union'),
  place('dk', 'Denmark', ['eu', 'dk']),
  place('us', 'United States'),
  place('us-ca', 'California', ['us', 'us-ca']),
  place('ci', "Côte d'Ivoire"),
  place('tr', 'Türkiye'),
];
const OTHERS = { us: 'USA America', dk: 'Danmark' };
const found = (asked: string): readonly string[] => searchRegions(PLACES, asked, OTHERS).map(({ code }) => code);

describe('folding', () => {
  test('accents, capitals and signs make no difference', () => {
    expect(foldText('  Côte d’IVOIRE ')).toBe('cote d ivoire');
    expect(foldText('Österreich')).toBe('osterreich');
    expect(foldText('Grønland')).toBe('gronland');
    expect(foldText('Weißensee')).toBe('weissensee');
    expect(foldText('us-ca')).toBe('us ca');
  });

  test('scripts without capitals stay as they are', () => {
    expect(foldText('日本')).toBe('日本');
  });
});

describe('search', () => {
  test('finds by the beginning of a name, by code and by another name', () => {
    expect(found('denm')).toEqual(['dk']);
    expect(found('US-CA')).toEqual(['us-ca']);
    expect(found('danmark')).toEqual(['dk']);
    expect(found('cote divoire')).toEqual([]);
    expect(found('cote ivoire')).toEqual(['ci']);
    expect(found('turkiye')).toEqual(['tr']);
  });

  test('a layer finds the places that are read with it', () => {
    expect(found('european union')).toEqual(['eu', 'dk']);
    expect(found('america')).toEqual(['us', 'us-ca']);
  });

  test('every word has to be found', () => {
    expect(found('united california')).toEqual(['us-ca']);
    expect(found('denmark california')).toEqual([]);
  });

  test('no words find every place', () => {
    expect(found('')).toHaveLength(PLACES.length);
    expect(found(' – ')).toHaveLength(PLACES.length);
  });
});

describe('nearest', () => {
  const near = (asked: string): readonly string[] => nearestRegions(PLACES, asked, OTHERS).map(({ code }) => code);

  test('two slips in a long name are forgiven, swapped letters count as one', () => {
    expect(near('Denmrak')).toEqual(['dk']);
    expect(near('Califronai')).toEqual(['us-ca']);
    expect(near('Danmakr')).toEqual(['dk']);
  });

  test('what is like nothing finds nothing', () => {
    expect(near('Atlantis')).toEqual([]);
    expect(near('zz')).toEqual([]);
  });
});
