import { existsSync, readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';

/* Every number promised in lib/<slice>/invariants.md is kept by a test that names it, and tests name no number that is not promised. */

const ID = /\b[A-Z]{2,}-\d+\b/g;
const TEST_NAME = /\b(?:test|it|describe)(?:\.\w+)*(?:\([^()]*\))?\(\s*(['"`])((?:\\.|(?!\1).)*)\1/g;
const PROMISE = /^\s*(?:[-*]\s+|#+\s+|\|\s*)?(?:\*\*)?([A-Z]{2,}-\d+)\b/gm;

function filesUnder(folder, ending) {
  if (!existsSync(folder)) return [];
  return readdirSync(folder, { recursive: true })
    .filter((name) => ending.test(name))
    .map((name) => path.join(folder, name));
}

function promisesIn(root) {
  const promised = new Map();
  const twice = [];
  for (const file of filesUnder(path.join(root, 'lib'), /(^|\/)invariants\.md$/)) {
    for (const [, id] of readFileSync(file, 'utf8').matchAll(PROMISE)) {
      if (promised.has(id)) twice.push(`${id} is promised twice: in ${promised.get(id)} and in ${path.relative(root, file)}`);
      promised.set(id, path.relative(root, file));
    }
  }
  return { promised, twice };
}

function namesIn(root) {
  // The house's own tests hold made-up names, to try this very check on.
  const files = filesUnder(path.join(root, 'tests'), /\.test\.tsx?$/).filter((file) => !file.includes(`${path.sep}house${path.sep}`));
  return files.flatMap((file) =>
    [...readFileSync(file, 'utf8').matchAll(TEST_NAME)].map(([, , name]) => ({ file: path.relative(root, file), name })),
  );
}

/** The faults found under a folder, in words. */
function faultsIn(root) {
  const { promised, twice } = promisesIn(root);
  const families = new Set([...promised.keys()].map((id) => id.split('-')[0]));
  const cited = new Set();
  const unknown = [];
  for (const { file, name } of namesIn(root)) {
    const leading = /^(?:[A-Z]{2,}-\d+[ ,:]*)+/.exec(name)?.[0] ?? '';
    for (const [id] of name.matchAll(ID)) {
      cited.add(id);
      const meant = leading.includes(id) || families.has(id.split('-')[0]);
      if (meant && !promised.has(id)) unknown.push(`${file} names ${id}, which no invariants.md promises`);
    }
  }
  const unkept = [...promised].filter(([id]) => !cited.has(id)).map(([id, file]) => `${id} of ${file} is named by no test`);
  return [...twice, ...unknown, ...unkept];
}

const faults = faultsIn(path.resolve(process.argv[2] ?? '.'));
for (const fault of faults) console.log(fault);
process.exitCode = faults.length === 0 ? 0 : 1;
