import path from 'node:path';
import { gzipSync } from 'node:zlib';
import { build } from 'vite';

const root = path.resolve(import.meta.dirname, '../..');
const ENTRY = 'footring:size';
const domain = (file: string, names: string): string =>
  `export { ${names} } from ${JSON.stringify(path.join(root, 'lib/checks/domain', file))};`;

/** Parts of the engine as something in a browser would load them. */
const BUNDLES: readonly { readonly name: string; readonly aim: string; readonly code: readonly string[] }[] = [
  {
    name: 'judging and asking over a compiled line',
    aim: 'at most 5 kB',
    code: [domain('judge.ts', 'judge, kleeneOf, exactOf'), domain('next-question.ts', 'nextQuestion, stillMatters, questionsOpenFor')],
  },
  {
    name: 'the same with compiling, why and what would change it',
    aim: '',
    code: [
      domain('judge.ts', 'judge, kleeneOf, exactOf, statusOfTerm'),
      domain('next-question.ts', 'nextQuestion, stillMatters, questionsOpenFor'),
      domain('line.ts', 'compileLine'),
      domain('trace.ts', 'traceRules'),
      domain('nearest-outcome.ts', 'nearestOutcome'),
      domain('cheapest-fact.ts', 'cheapestFacts'),
    ],
  },
];

async function bundled(code: string, without: readonly string[]): Promise<string> {
  const result = await build({
    configFile: false,
    root,
    logLevel: 'error',
    resolve: { alias: { '@': root } },
    plugins: [{ name: 'footring-size', resolveId: (id) => (id === ENTRY ? ENTRY : null), load: (id) => (id === ENTRY ? code : null) }],
    build: {
      write: false,
      minify: true,
      target: 'es2022',
      modulePreload: false,
      rolldownOptions: { input: ENTRY, preserveEntrySignatures: 'strict', external: [...without] },
    },
  });
  if (Array.isArray(result) || !('output' in result)) throw new Error('One bundle was expected');
  return result.output.map((chunk) => (chunk.type === 'chunk' ? chunk.code : '')).join('');
}

/** Rows of minified and gzipped sizes, each also scanned for code made at run time. */
export async function sizes(): Promise<readonly string[]> {
  const rows: string[] = [];
  for (const { name, aim, code } of BUNDLES) {
    for (const [what, without] of [
      ['', ['decimal.js']],
      [', with decimal.js', []],
    ] as const) {
      const text = await bundled(code.join('\n'), without);
      const made = /\beval\s*\(|\bFunction\s*\(/.test(text) ? 'found' : 'none';
      rows.push(
        `| ${name}${what} | ${(text.length / 1000).toFixed(1)} | ${(gzipSync(text).length / 1000).toFixed(1)} | ${made} | ${what === '' ? aim : ''} |`,
      );
    }
  }
  return rows;
}
