import { describe, expect, test } from 'vitest';
import { z } from 'zod';
import { absorptionOf, usTariffBody } from '@/lib/pieces/domain/absorption';
import { exampleIds, workedExample } from './worked-examples';

const examples = ['we-wa-01', 'we-wa-02'].map((id) =>
  workedExample(
    id,
    z.object({ D_g: z.number(), M_g: z.number(), S_g: z.number() }),
    z.object({ V_cm3: z.number(), WA_pct: z.number(), porosity_pct: z.number(), bulk_density: z.number(), apparent_SG: z.number() }),
  ),
);
const tariff = workedExample('we-wa-03', z.object({ WA_pct: z.array(z.number()) }), z.object({ class_by_absorption: z.array(z.string()) }));

describe('absorption', () => {
  test('PIECE-15 every worked example stands below', () => {
    expect(exampleIds(['water_absorption'])).toEqual(['we-wa-01', 'we-wa-02', 'we-wa-03']);
  });

  test.each(examples)('PIECE-15 three weighings ($by)', ({ inputs, expected }) => {
    expect(absorptionOf({ dry: inputs.D_g, suspended: inputs.S_g, saturated: inputs.M_g })).toEqual({
      ok: true,
      value: {
        exteriorVolumeCm3: expected.V_cm3,
        absorptionPercent: expected.WA_pct,
        apparentPorosityPercent: expected.porosity_pct,
        bulkDensity: expected.bulk_density,
        apparentSpecificGravity: expected.apparent_SG,
      },
    });
  });

  test.each(tariff.inputs.WA_pct.map((percent, at) => [percent, tariff.expected.class_by_absorption[at]] as const))(
    `PIECE-15 %s %% by the US tariff note is %s (${tariff.by})`,
    (percent, body) => {
      expect(usTariffBody(percent).replace('-', '_')).toBe(body);
    },
  );

  test('PIECE-15 exactly 0.5 % and 3 % come out exactly, where floating point would not', () => {
    const percent = (dry: string, saturated: string) => {
      const found = absorptionOf({ dry, suspended: '60', saturated });
      return found.ok ? found.value.absorptionPercent : null;
    };
    expect([percent('120', '123.6'), percent('110.2', '110.751'), percent('100.1', '103.103')]).toEqual([3, 0.5, 3]);
  });

  test.each([
    [
      { dry: 120, suspended: 73.6, saturated: Number.NaN },
      { kind: 'not-a-weight', weighing: 'saturated' },
    ],
    [
      { dry: -1, suspended: 73.6, saturated: 80 },
      { kind: 'not-a-weight', weighing: 'dry' },
    ],
    [
      { dry: 120, suspended: '73,6', saturated: 125 },
      { kind: 'not-a-weight', weighing: 'suspended' },
    ],
    [
      { dry: 120, suspended: 73.6, saturated: 1e309 },
      { kind: 'not-a-weight', weighing: 'saturated' },
    ],
    [{ dry: 0, suspended: 0, saturated: 5 }, { kind: 'dry-not-above-zero' }],
    [{ dry: 120, suspended: 73.6, saturated: 119.9 }, { kind: 'saturated-under-dry' }],
    [{ dry: 120, suspended: 120, saturated: 123 }, { kind: 'suspended-not-under-dry' }],
    [{ dry: 120, suspended: 130, saturated: 123 }, { kind: 'suspended-not-under-dry' }],
    [{ dry: 120, suspended: 123, saturated: 123 }, { kind: 'suspended-not-under-dry' }],
  ] as const)('PIECE-15 impossible weighings %o are refused', (weighings, fault) => {
    expect(absorptionOf(weighings)).toEqual({ ok: false, error: fault });
  });

  test('PIECE-15 a body that takes up no water has no open pores', () => {
    expect(absorptionOf({ dry: 120, suspended: 70, saturated: 120 })).toMatchObject({
      ok: true,
      value: { absorptionPercent: 0, apparentPorosityPercent: 0, bulkDensity: 2.4, apparentSpecificGravity: 2.4 },
    });
  });
});
