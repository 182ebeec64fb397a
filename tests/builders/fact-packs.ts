import { readdirSync, readFileSync } from 'node:fs';
import { z } from 'zod';

/*
 * Researched facts of law and practice, each with its source and whether it was read: the outside to check the sheets against.
 */
const fact = z.looseObject({
  id: z.string(),
  topic: z.string(),
  evidence: z.enum(['read', 'memory', 'common-practice']),
  never_must: z.array(z.string()).default([]),
  values: z.record(z.string(), z.unknown()).default({}),
});
export type Fact = z.output<typeof fact>;

const pack = z.looseObject({
  regions: z.array(z.looseObject({ code: z.string(), facts: z.array(fact) })).default([]),
  facts: z.array(fact).default([]),
});

const FOLDER = new URL('../fixtures/facts/', import.meta.url);

const packs = readdirSync(FOLDER)
  .filter((name) => name.endsWith('.json'))
  .map((name) => pack.parse(JSON.parse(readFileSync(new URL(name, FOLDER), 'utf8'))));

/** The code of the sheet that carries a pack's facts: as the pack writes it, but for ISO/IEC 17025, whose code has one part too many. */
export const sheetCodeOf = (code: string): string => code.toLowerCase().replace(/^iso-iec-/, 'iso-');

/** Facts by the code of the sheet that should carry them; those of ceramics science belong to `care`. */
export const factsByRegion: ReadonlyMap<string, readonly Fact[]> = new Map([
  ...packs.flatMap(({ regions }) => regions.map(({ code, facts }) => [sheetCodeOf(code), facts] as const)),
  ['care', packs.flatMap(({ facts }) => facts)] as const,
]);
