import { spawnSync } from 'node:child_process';
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { z } from 'zod';

/** What stands in the files that others import. */
const THERE: Readonly<Record<string, string>> = {
  'lib/kernel/tri.ts': 'export const tri = 1;',
  'lib/regions/domain/rule.ts': 'export type Rule = string; export const rule = 1;',
  'lib/regions/read-rule.ts': 'export const readRule = 1;',
  'lib/server/env.ts': 'export const env = 1;',
  'db/rules.ts': 'export type Row = string; export const rows = 1;',
  'content/messages/en.json': '{}',
  'tests/builders/a-rule.ts': 'export const aRule = 1;',
};

const REFUSED: readonly (readonly [file: string, why: string, text: string])[] = [
  ['lib/checks/domain/a.ts', 'the domain reads the database', "import { rows } from '@/db/rules'; export const a = rows;"],
  ['lib/checks/domain/b.ts', 'the domain names a type of the database', "import type { Row } from '@/db/rules'; export type B = Row;"],
  ['lib/checks/domain/c.ts', 'the domain reaches into Node', "import { randomUUID } from 'node:crypto'; export const c = randomUUID;"],
  ['lib/checks/d.ts', 'a use case calls another slice', "import { readRule } from '../regions/read-rule'; export const d = readRule;"],
  ['lib/checks/e.ts', 'a use case talks to the driver', "import mysql from 'mysql2'; export const e = mysql;"],
  ['lib/checks/f.ts', 'the file does not exist', "import { env } from '@/lib/server/nowhere'; export const f = env;"],
  ['lib/kernel/g.ts', 'the kernel knows a slice', "import { rule } from '../regions/domain/rule'; export const g = rule;"],
  ['components/h.ts', 'a component reads the server', "import { env } from '@/lib/server/env'; export const h = env;"],
  ['app/i.ts', 'a page reads the database', "import { rows } from '@/db/rules'; export const i = rows;"],
  ['lib/checks/j.ts', 'the site leans on tests', "import { aRule } from '@/tests/builders/a-rule'; export const j = aRule;"],
  [
    'tests/properties/oracle.ts',
    'the oracle borrows from what it judges',
    "import type { Rule } from '@/lib/regions/domain/rule'; export type K = Rule;",
  ],
  ['lib/kernel/l.ts', 'two files lean on each other', "import { m } from './m'; export const l: number = m;"],
];

const ACCEPTED: readonly (readonly [file: string, text: string])[] = [
  ['lib/kernel/m.ts', "import { l } from './l'; export const m: number = l;"], // the other half of the circle above
  ['lib/kernel/words.ts', "import en from '@/content/messages/en.json'; export const words = en;"],
  [
    'lib/checks/domain/n.ts',
    "import type { Rule } from '@/lib/regions/domain/rule'; import { tri } from '@/lib/kernel/tri'; export const n: [Rule, number] = ['', tri];",
  ],
  ['lib/checks/o.ts', "import { z } from 'zod'; import { rows } from '@/db/rules'; export const o = [z, rows];"],
  ['app/p.ts', "import { readRule } from '@/lib/regions/read-rule'; export const p = readRule;"],
  ['db/q.ts', "import { setTimeout } from 'node:timers/promises'; export const q = setTimeout;"],
  ['proxy.ts', "import { env } from '@/lib/server/env'; export const r = env;"],
];

const report = z.object({
  summary: z.object({ violations: z.array(z.object({ from: z.string(), rule: z.object({ name: z.string() }) })) }),
});
const folder = mkdtempSync(path.join(tmpdir(), 'footring-imports-'));
let faulty: ReadonlyMap<string, readonly string[]> = new Map();

function put(file: string, text: string): void {
  mkdirSync(path.join(folder, path.dirname(file)), { recursive: true });
  writeFileSync(path.join(folder, file), text);
}

beforeAll(() => {
  for (const [file, text] of Object.entries(THERE)) put(file, text);
  for (const [file, , text] of REFUSED) put(file, text);
  for (const [file, text] of ACCEPTED) put(file, text);
  for (const name of ['zod', 'mysql2']) {
    put(`node_modules/${name}/package.json`, JSON.stringify({ name, main: 'index.js' }));
    put(`node_modules/${name}/index.js`, 'exports.z = 1;');
  }
  put(
    'tsconfig.json',
    JSON.stringify({
      compilerOptions: { module: 'esnext', moduleResolution: 'bundler', resolveJsonModule: true, paths: { '@/*': ['./*'] } },
    }),
  );
  const tool = path.resolve('node_modules/dependency-cruiser/bin/dependency-cruise.mjs');
  const args = [
    tool,
    '--config',
    path.resolve('.ci/dependency-rules.cjs'),
    '-T',
    'json',
    'app',
    'components',
    'db',
    'lib',
    'tests',
    'proxy.ts',
  ];
  const { stdout } = spawnSync(process.execPath, args, { cwd: folder, encoding: 'utf8', maxBuffer: 64 * 1024 * 1024 });
  const { violations } = report.parse(JSON.parse(stdout)).summary;
  faulty = new Map(violations.map(({ from }) => [from, violations.filter((other) => other.from === from).map(({ rule }) => rule.name)]));
}, 60_000);

afterAll(() => {
  rmSync(folder, { recursive: true, force: true });
});

test.each(REFUSED)('%s is refused: %s', (file) => {
  expect(faulty.has(file)).toBe(true);
});

test('a circle and a borrowing oracle are named as such', () => {
  expect(faulty.get('lib/kernel/l.ts')).toContain('no-cycles');
  expect(faulty.get('tests/properties/oracle.ts')).toContain('oracle-stands-alone');
  expect(faulty.get('lib/checks/j.ts')).toContain('nothing-imports-tests');
});

test.each(ACCEPTED.slice(1))('%s may import what it does', (file) => {
  expect(faulty.get(file) ?? []).toEqual([]);
});
