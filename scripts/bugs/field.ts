import { execFile } from 'node:child_process';
import { cpSync, mkdtempSync, readFileSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import type { Edit } from './planted';

const COPIED = ['lib', 'tests/properties', 'tests/unit/checks', 'tests/builders', 'scripts/bench', '.ci', 'package.json', 'tsconfig.json'];
const LINKED = ['node_modules', 'content'];

export type Verdict = { readonly passed: number; readonly failed: readonly string[]; readonly ms: number };

/** A copy of what the engine's tests need, in a folder of its own, where mistakes can be planted. */
export class Field {
  readonly folder = mkdtempSync(path.join(os.tmpdir(), 'footring-bugs-'));

  constructor(private readonly root: string) {
    for (const name of COPIED) cpSync(path.join(root, name), path.join(this.folder, name), { recursive: true });
    for (const name of LINKED) symlinkSync(path.join(root, name), path.join(this.folder, name));
    // A failing case need not be made small: that it fails is enough.
    this.change({ file: 'tests/properties/systems.ts', from: 'numRuns: 1000,', to: 'numRuns: 1000, endOnFailure: true,' });
  }

  remove(): void {
    rmSync(this.folder, { recursive: true, force: true });
  }

  /** Makes the edits; answers with the text each no longer finds exactly once. The originals come back with `restore`. */
  plant(edits: readonly Edit[]): readonly string[] {
    return edits.flatMap((edit) => (this.change(edit) ? [] : `${edit.file}: ${edit.from}`));
  }

  restore(edits: readonly Edit[]): void {
    for (const { file } of edits) cpSync(path.join(this.root, file), path.join(this.folder, file));
  }

  /** Runs one file's tests, only those whose name begins as given. */
  async run(suite: string, test: string): Promise<Verdict> {
    const report = path.join(this.folder, 'report.json');
    rmSync(report, { force: true });
    const began = performance.now();
    await new Promise<void>((resolve) => {
      const vitest = path.join(this.root, 'node_modules/vitest/vitest.mjs');
      const shown = ['--config', '.ci/vitest.config.ts', '--bail', '1', '--reporter', 'json', '--outputFile', report];
      execFile(process.execPath, [vitest, 'run', '--root', '.', ...shown, '-t', `${test} `, suite], { cwd: this.folder }, () => {
        resolve();
      });
    });
    return { ...readReport(report), ms: performance.now() - began };
  }

  private change({ file, from, to }: Edit): boolean {
    const place = path.join(this.folder, file);
    const [before, after, ...more] = readFileSync(place, 'utf8').split(from);
    if (before === undefined || after === undefined || more.length > 0) return false;
    writeFileSync(place, before + to + after);
    return true;
  }
}

type Report = {
  readonly testResults: readonly {
    readonly assertionResults: readonly { readonly title: string; readonly fullName: string; readonly status: string }[];
  }[];
};

/** Counts only tests that ran: a file that does not even load has caught nothing. */
function readReport(file: string): Omit<Verdict, 'ms'> {
  const { testResults } = JSON.parse(readFileSync(file, 'utf8')) as Report;
  const all = testResults.flatMap(({ assertionResults }) => assertionResults);
  return {
    passed: all.filter(({ status }) => status === 'passed').length,
    failed: all.filter(({ status }) => status === 'failed').map(({ fullName }) => fullName),
  };
}
