import { spawn } from 'node:child_process';
import { createInterface } from 'node:readline';
import { z } from 'zod';

const said = z.object({ up: z.boolean(), ownerUrl: z.string().optional(), appUrl: z.string().optional() });

export type OwnDatabase = {
  readonly ownerUrl: string;
  readonly appUrl: string;
  /** As a power cut does for the process: no chance to write anything down. */
  readonly kill: () => Promise<void>;
  /** On the same data and port. */
  readonly start: () => Promise<void>;
  readonly end: () => Promise<void>;
};

/** A database server of this test alone, that may be killed. */
export async function openOwnDatabase(): Promise<OwnDatabase> {
  const child = spawn(process.execPath, ['tests/builders/killable-database.mjs'], { stdio: ['pipe', 'pipe', 'inherit'] });
  const over = new Promise<void>((resolve) =>
    child.once('exit', () => {
      resolve();
    }),
  );
  const lines = createInterface(child.stdout)[Symbol.asyncIterator]();
  const next = async (): Promise<z.output<typeof said>> => {
    const line = await lines.next();
    if (line.done === true) throw new Error('The database server of this test ended.');
    return said.parse(JSON.parse(line.value));
  };
  const ask = async (word: string): Promise<void> => {
    child.stdin.write(`${word}\n`);
    await next();
  };
  const { ownerUrl = '', appUrl = '' } = await next();
  return {
    ownerUrl,
    appUrl,
    kill: () => ask('kill'),
    start: () => ask('start'),
    end: () => {
      child.stdin.end();
      return over;
    },
  };
}
