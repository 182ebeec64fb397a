import { readFileSync } from 'node:fs';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { build, type Plugin } from 'vite';
import { Mutator, type Mutant } from './mutants';

export type Bundle = { readonly file: string; readonly mutants: readonly Mutant[] };

const ENTRY = 'footring:mutation';

/** All tests and the whole engine in one file, every mutant of the engine asleep in it. */
export async function bundle(
  root: string,
  { engine, tests, to }: { engine: readonly string[]; tests: readonly string[]; to: string },
): Promise<Bundle> {
  const mutants: Mutant[] = [];
  const mutated = new Map<string, string>();
  for (const file of engine) {
    const made = new Mutator(file, readFileSync(path.join(root, file), 'utf8'), mutants.length + 1).run();
    mutants.push(...made.mutants);
    mutated.set(path.join(root, file), made.code);
  }
  await build({
    configFile: false,
    root,
    logLevel: 'error',
    resolve: {
      alias: {
        vitest: path.join(root, 'scripts/mutation/inside.ts'),
        'server-only': path.join(root, '.ci/empty.ts'),
        '@': root,
      },
    },
    plugins: [planting(root, tests, mutated)],
    ssr: { noExternal: true },
    build: { ssr: true, target: 'node20', minify: false, outDir: to, emptyOutDir: true, rolldownOptions: { input: ENTRY } },
  });
  return { file: path.join(to, 'mutation.mjs'), mutants };
}

function planting(root: string, tests: readonly string[], mutated: ReadonlyMap<string, string>): Plugin {
  return {
    name: 'footring-mutation',
    enforce: 'pre',
    resolveId: (id) => (id === ENTRY ? ENTRY : null),
    load: (id) =>
      id === ENTRY ? tests.map((file) => `import ${JSON.stringify(path.join(root, file))};`).join('\n') : (mutated.get(id) ?? null),
    transform: (code, id) => {
      if (!id.startsWith(root) || id.includes('node_modules')) return null;
      const here = code.replaceAll('import.meta.url', JSON.stringify(pathToFileURL(id).href));
      return id.includes('/tests/properties/')
        ? here.replace('numRuns: 1000,', 'get numRuns() { return planted.runs; }, endOnFailure: true,')
        : here;
    },
    outputOptions: (options) => ({ ...options, entryFileNames: 'mutation.mjs', codeSplitting: false }),
  };
}
