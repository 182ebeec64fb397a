import { existsSync, mkdtempSync, readdirSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { parseArgs } from 'node:util';
import { Random } from './bench/random';
import { bundle } from './mutation/bundle';
import { EQUIVALENT } from './mutation/equivalent';
import { hunt, type Fate } from './mutation/hunt';
import type { Mutant } from './mutation/mutants';

/*
 * npm run mutation [-- --all] [--sample 300] [--seed 7] [files]: changes one operator or statement of the engine at a time and
 * looks whether a test notices. Prints the share noticed for each file and every change that got through.
 */

const ENGINE = [
  'attacks',
  'cells',
  'cell-range',
  'cheapest-fact',
  'compile-condition',
  'condition-reading',
  'diagram',
  'diagram-builder',
  'exact-status',
  'gates',
  'judge',
  'knowledge',
  'line',
  'line-build',
  'nearest-outcome',
  'next-question',
  'reason',
  'region-cells',
  'restriction',
  'tape',
  'terms',
  'trace',
];
const AIM = 0.9;

const root = path.resolve(import.meta.dirname, '..');
const testsIn = (folder: string, wanted: RegExp): readonly string[] =>
  readdirSync(path.join(root, folder)).flatMap((name) => (wanted.test(name) ? `${folder}/${name}` : []));
/** Tests of the engine itself; those of what is built on it would notice too, but more slowly. */
const TESTS = [
  ...testsIn('tests/unit/checks', /^(?!sheet-).*[.]test[.]ts$/),
  ...testsIn('tests/properties', /^check-(?!clash|meaning).*[.]test[.]ts$/),
];

const short = (text: string): string => text.replaceAll(/\s+/g, ' ').trim();

const isEquivalent = ({ file, original, mutated }: Mutant): boolean =>
  EQUIVALENT.some((known) => file.endsWith(`/${known.file}`) && known.original === short(original) && known.mutated === short(mutated));

function sampled(mutants: readonly Mutant[], count: number, seed: number): readonly Mutant[] {
  const random = new Random(seed);
  const drawn = mutants.map((mutant) => ({ mutant, by: random.next() })).sort((a, b) => a.by - b.by);
  return drawn.slice(0, count).map(({ mutant }) => mutant);
}

function table(fates: readonly Fate[]): string {
  const files = [...new Set(fates.map(({ mutant }) => mutant.file))].sort();
  const row = (name: string, own: readonly Fate[]): string => {
    const noticed = own.filter(({ by }) => by !== null).length;
    return `| ${name} | ${own.length} | ${noticed} | ${own.length - noticed} | ${((100 * noticed) / own.length).toFixed(1)} % |`;
  };
  const rows = files.map((file) =>
    row(
      path.basename(file),
      fates.filter(({ mutant }) => mutant.file === file),
    ),
  );
  return ['| file | mutants | noticed | got through | share |', '|---|---:|---:|---:|---:|', ...rows, row('**all**', fates)].join('\n');
}

const told = ({ file, line, original, mutated }: Mutant): string =>
  `${path.basename(file)}:${line}  ${short(original).slice(0, 160)}  →  ${mutated === '' ? '(removed)' : short(mutated).slice(0, 160)}`;

async function main(): Promise<boolean> {
  const { values, positionals } = parseArgs({
    options: {
      all: { type: 'boolean', default: false },
      sample: { type: 'string', default: '300' },
      seed: { type: 'string', default: '7' },
    },
    allowPositionals: true,
  });
  const files = ENGINE.filter((name) => positionals.length === 0 || positionals.includes(name)).map(
    (name) => `lib/checks/domain/${name}.ts`,
  );
  const to = mkdtempSync(path.join(os.tmpdir(), 'footring-mutation-'));
  try {
    const made = await bundle(root, { engine: files.filter((file) => existsSync(path.join(root, file))), tests: TESTS, to });
    const worth = made.mutants.filter((mutant) => !isEquivalent(mutant));
    const tried = values.all ? worth : sampled(worth, Number(values.sample), Number(values.seed));
    const set = made.mutants.length - worth.length;
    console.log(`${tried.length} of ${worth.length} mutants (${set} more are known to change nothing); seed ${values.seed}.`);
    const fates: Fate[] = [];
    await hunt(made.file, tried, (fate) => {
      fates.push(fate);
      if (fate.by === null) console.log(told(fate.mutant));
    });
    console.log(`\n${table(fates)}`);
    return fates.filter(({ by }) => by !== null).length >= AIM * fates.length;
  } finally {
    rmSync(to, { recursive: true, force: true });
  }
}

process.exitCode = (await main()) ? 0 : 1;
