import { spawn } from 'node:child_process';
import { createInterface } from 'node:readline';
import knex from 'knex';
import type { TestProject } from 'vitest/node';
import { z } from 'zod';
import { connectionTo, knexSettings } from '../../db/knex-settings';

declare module 'vitest' {
  export interface ProvidedContext {
    readonly ownerUrl: string;
    readonly appUrl: string;
  }
}

const addresses = z.object({ ownerUrl: z.string(), appUrl: z.string() });
type Server = z.output<typeof addresses> & { readonly end: () => Promise<void> };

let server: Server | undefined;

/** One database server for all workers: that of `npm test`, or one of our own when somebody runs vitest by hand. */
export async function setup(project: TestProject): Promise<void> {
  const given = addresses.safeParse({ ownerUrl: process.env['FOOTRING_TEST_OWNER_URL'], appUrl: process.env['FOOTRING_TEST_APP_URL'] });
  server = given.success ? { ...given.data, end: () => Promise.resolve() } : await startServer();
  project.provide('ownerUrl', server.ownerUrl);
  project.provide('appUrl', server.appUrl);
  await dropLeftovers(server.ownerUrl);
}

/** Ends the server if it is ours. */
export async function teardown(): Promise<void> {
  await server?.end();
}

async function startServer(): Promise<Server> {
  const child = spawn(process.execPath, ['scripts/test-database.mjs'], { stdio: ['pipe', 'pipe', 'inherit'] });
  const ended = new Promise<void>((resolve) =>
    child.once('exit', () => {
      resolve();
    }),
  );
  for await (const line of createInterface(child.stdout)) {
    if (!line.startsWith('{')) continue;
    const end = (): Promise<void> => {
      child.stdin.end();
      return ended;
    };
    return { ...addresses.parse(JSON.parse(line)), end };
  }
  throw new Error('The database server for tests did not start.');
}

// Each worker makes its database when its first file runs; one of an earlier run may have other tables.
async function dropLeftovers(ownerUrl: string): Promise<void> {
  const owner = knex({ ...knexSettings({ most: 1 }), connection: connectionTo(ownerUrl) });
  const rows: unknown = await owner('information_schema.schemata')
    .where('schema_name', 'like', 'footring_test_%')
    .select({ name: 'schema_name' });
  for (const { name } of z.array(z.object({ name: z.string() })).parse(rows)) await owner.raw('DROP DATABASE ??', [name]);
  await owner.destroy();
}
