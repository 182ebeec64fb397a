import path from 'node:path';
import { Field } from './bugs/field';
import { PLANTED_BUGS, type PlantedBug } from './bugs/planted';

/* npm run bugs [words]: plants known mistakes in a copy of the engine, one at a time, and has the named test look for each. */

type Row = {
  readonly bug: PlantedBug;
  readonly outcome: 'caught' | 'SURVIVED' | 'NO LONGER FITS';
  readonly ms: number;
  readonly note: string;
};

async function tryBug(field: Field, bug: PlantedBug): Promise<Row> {
  const misfits = field.plant(bug.edits);
  if (misfits.length > 0) {
    field.restore(bug.edits);
    return { bug, outcome: 'NO LONGER FITS', ms: 0, note: misfits.join('; ') };
  }
  const { failed, ms } = await field.run(bug.suite, bug.test);
  field.restore(bug.edits);
  const by = failed.find((name) => name.includes(bug.test));
  return { bug, outcome: by === undefined ? 'SURVIVED' : 'caught', ms, note: by ?? '' };
}

/** The same tests on the engine as it is: what fails there proves nothing. */
async function soundOrNot(field: Field, bugs: readonly PlantedBug[]): Promise<readonly string[]> {
  const suites = new Map(bugs.map(({ suite, test }) => [`${suite} ${test}`, { suite, test }]));
  const faults: string[] = [];
  for (const { suite, test } of suites.values()) {
    const { passed, failed } = await field.run(suite, test);
    if (passed === 0 || failed.length > 0) faults.push(`${suite} ${test}: ${passed} passed, ${failed.length} failed`);
  }
  return faults;
}

async function main(words: string): Promise<boolean> {
  const bugs = PLANTED_BUGS.filter(({ name }) => name.includes(words));
  const field = new Field(path.resolve(import.meta.dirname, '..'));
  try {
    const faults = await soundOrNot(field, bugs);
    for (const fault of faults) console.log(`Without any bug: ${fault}`);
    console.log('| planted bug | where | test | outcome | s |\n|---|---|---|---|---:|');
    let missed = 0;
    for (const bug of bugs) {
      const { outcome, ms, note } = await tryBug(field, bug);
      if (outcome !== 'caught') missed += 1;
      const where = bug.edits.map(({ file }) => path.basename(file)).join(', ');
      console.log(
        `| ${bug.name} | ${where} | ${bug.test} | ${outcome}${outcome === 'NO LONGER FITS' ? `: ${note}` : ''} | ${(ms / 1000).toFixed(1)} |`,
      );
    }
    console.log(`\n${bugs.length - missed} of ${bugs.length} planted bugs caught.`);
    return missed === 0 && faults.length === 0 && bugs.length > 0;
  } finally {
    field.remove();
  }
}

process.exitCode = (await main(process.argv.slice(2).join(' '))) ? 0 : 1;
