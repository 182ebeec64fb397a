import { readFileSync } from 'node:fs';
import { z } from 'zod';

/*
 * Worked examples with an outside source each: the formula's publisher, or a note that it was written down from memory.
 */
const example = z.looseObject({
  id: z.string(),
  inputs: z.record(z.string(), z.unknown()),
  expected: z.record(z.string(), z.unknown()),
  source: z.looseObject({ publisher: z.string(), identifier: z.string(), locator: z.string(), version_date: z.string() }),
});

const FILE = new URL('../../fixtures/facts/ceramics-science.json', import.meta.url);
const pack = z.looseObject({ worked_examples: z.array(example) }).parse(JSON.parse(readFileSync(FILE, 'utf8')));
const byId = new Map(pack.worked_examples.map((one) => [one.id, one]));

/** A worked example read by its shape, and its source in words for the test's name. */
export function workedExample<I extends z.ZodType, E extends z.ZodType>(
  id: string,
  inputs: I,
  expected: E,
): { readonly inputs: z.output<I>; readonly expected: z.output<E>; readonly by: string } {
  const found = byId.get(id);
  if (found === undefined) throw new Error(`There is no worked example ${id}`);
  const { publisher, identifier, locator, version_date: version } = found.source;
  const by = [publisher, identifier, locator, version].filter((text) => text !== '').join(', ');
  return { inputs: inputs.parse(found.inputs), expected: expected.parse(found.expected), by: `${id}: ${by}` };
}

/** Every worked example of some topics, by id: so that none is forgotten. */
export const exampleIds = (topics: readonly string[]): readonly string[] =>
  pack.worked_examples.flatMap((one) => (topics.includes(String(one['topic'])) ? [one.id] : []));
