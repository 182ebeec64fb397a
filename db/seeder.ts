import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import type { Knex } from 'knex';
import { z } from 'zod';

/** Where the starting data are, and the words that search is made of. */
const WORDS = ['./content/seed', './content/notes', './content/words'];
const runRows = z.array(z.object({ file: z.string(), sources: z.string() }));

/**
 * Runs each file of db/seeds that this database has not met in its present form, in the order of their names, and answers with
 * those run. A file is noted after it has ended well, so that one cut short is run again: a seed must bear being run twice.
 */
export async function seed(owner: Knex, folder = './db/seeds'): Promise<readonly string[]> {
  const files = filesIn(folder).filter((name) => name.endsWith('.ts'));
  if (files.length === 0) return [];
  await makeTable(owner);
  const rows: unknown = await owner('seed_runs').select('file', 'sources');
  const done = new Map(runRows.parse(rows).map(({ file, sources }) => [file, sources]));
  const due = files
    .map((file) => ({ file, sources: fingerprintOf(folder, file) }))
    .filter(({ file, sources }) => done.get(file) !== sources);
  for (const { file, sources } of due) {
    await owner.seed.run({ directory: folder, specific: file, extension: 'ts', loadExtensions: ['.ts'] });
    await owner('seed_runs').insert({ file, sources }).onConflict('file').merge({ sources });
  }
  return due.map(({ file }) => file);
}

/** The seed itself and all the words and starting data that seeds put in. */
function fingerprintOf(folder: string, file: string): string {
  const hash = createHash('sha256').update(readFileSync(path.join(folder, file)));
  for (const place of WORDS) {
    for (const name of filesIn(place)) hash.update(`\n${name}\n`).update(readFileSync(path.join(place, name)));
  }
  return hash.digest('hex');
}

function filesIn(folder: string): readonly string[] {
  if (!existsSync(folder)) return [];
  return readdirSync(folder, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => path.relative(folder, path.join(entry.parentPath, entry.name)))
    .sort();
}

async function makeTable(owner: Knex): Promise<void> {
  await owner.raw(
    'CREATE TABLE IF NOT EXISTS seed_runs (' +
      'file VARCHAR(190) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY, ' +
      'sources CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL, ' +
      'run_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3) ON UPDATE CURRENT_TIMESTAMP(3)) ENGINE = InnoDB',
  );
}
