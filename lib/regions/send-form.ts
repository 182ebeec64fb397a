import { z } from 'zod';
import { itemInput, sendInput } from './amendment-schema';

const NAME = /^intended[.](?<id>.+)$/;

/** The form that sends an amendment: its fields called `intended.<id>` are the words for trial pieces. */
export const sendForm = z.preprocess((sent) => {
  const fields = new Map(typeof sent === 'object' && sent !== null ? Object.entries(sent) : []);
  const intended = [...fields].flatMap(([name, value]) => {
    const id = NAME.exec(name)?.groups?.['id'];
    return id === undefined ? [] : [[id, value] as const];
  });
  const [key, id, version, summary] = ['key', 'id', 'version', 'summary'].map((name): unknown => fields.get(name));
  return { key, id, version, summary, intended: Object.fromEntries(intended) };
}, sendInput);

/** The form that puts a kept file with the source whose form it belongs to. */
export const attachForm = itemInput.extend({ file: z.uuid(), version: z.coerce.number().int().nonnegative().max(4_000_000_000) });
export type AttachForm = z.output<typeof attachForm>;
