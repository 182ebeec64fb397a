import { expect, test } from 'vitest';
import { MESSAGES, words } from '@/lib/kernel/words';
import type { Absorption, TariffBody, Weighing, WeighingFault } from '@/lib/pieces/domain/absorption';
import type { ConeFault, ConeSeries } from '@/lib/pieces/domain/cone';
import type { MeasureUnit } from '@/lib/pieces/domain/imperial';
import type { DepthRule, Evidence } from '@/lib/pieces/domain/region-measures';
import type { MeasureFault } from '@/lib/pieces/domain/typed-measure';
import type { ProfileFault } from '@/lib/pieces/domain/vessel';
import type { WaterFault } from '@/lib/pieces/domain/weighed-water';
import type { Clearance, GuardFault } from '@/lib/readings/domain/guard-band';
import type { SampleFault } from '@/lib/readings/domain/statistics';

type Said<Key extends string> = Readonly<Record<Key, string>>;
const { profile, cone, unit, absorption, doubt, sample } = MESSAGES.measures;

/** A key that is missing does not compile. */
const SAID = [
  profile.fault satisfies Said<ProfileFault['kind']>,
  profile.depth satisfies Said<DepthRule>,
  cone.fault satisfies Said<ConeFault['kind']>,
  cone.series satisfies Said<ConeSeries>,
  cone.evidence satisfies Said<Evidence>,
  unit.spoken satisfies Said<MeasureUnit>,
  unit.fault satisfies Said<MeasureFault | 'not-the-same-quantity'>,
  absorption.fault satisfies Said<WeighingFault['kind']>,
  absorption.fields satisfies Said<Weighing>,
  absorption.results satisfies Said<keyof Absorption>,
  absorption.tariff satisfies Said<TariffBody>,
  absorption.water satisfies Said<WaterFault>,
  doubt.text satisfies Said<Clearance>,
  doubt.fault satisfies Said<GuardFault>,
  sample.fault satisfies Said<SampleFault>,
];

test('PIECE-19 every refusal and choice has words of its own', () => {
  for (const said of SAID) expect(new Set(Object.values(said)).size).toBe(Object.keys(said).length);
});

test('PIECE-19 shares are told in percent', () => {
  expect(words('measures.sample.clean', { count: 6, share: 0.393038 })).toContain('6 specimens under the limit');
  expect(words('measures.sample.clean', { count: 6, share: 0.393038 })).toContain('39.3%');
});

test('PIECE-16 the doubt of a lab is told without a verdict', () => {
  const said = Object.values(doubt).flatMap((text) => (typeof text === 'string' ? [text] : Object.values(text)));
  expect(said.filter((text) => /\b(pass|passes|passed|fail|fails|failed|within)\b/i.test(text))).toEqual([]);
});
