// What a page weighs, read from a finished build. Prints every figure and fails over V5 (script) and V6 (styles).
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import vm from 'node:vm';
import { gzipSync } from 'node:zlib';

const dist = process.env.FOOTRING_DIST || '.next';
/** next 16.4.6 with react 19.3.1, a bare route. Measured anew at each upgrade, and a ceiling by itself. */
const FRAMEWORK = 134_926;
const KB = 1000;
/** V5, beyond the framework: what must hold for reading, checking, and editing or approving. */
const SCRIPT = { read: 5 * KB, check: 20 * KB, edit: 60 * KB };
/** V6: all style sheets of the site together. */
const STYLES = 20 * KB;

const read = (file) => readFileSync(join(dist, file), 'utf8');
const sizes = new Map();
const sizeOf = (file) => {
  if (!sizes.has(file)) sizes.set(file, gzipSync(readFileSync(join(dist, file)), { level: 9 }).length);
  return sizes.get(file);
};
const sum = (files) => [...files].reduce((total, file) => total + sizeOf(file), 0);

function kindOf(route) {
  if (/^\/(bench|sorting-table|stewards|look-again|doubts|regions\/new)(\/|$)|\/(amend(ments)?|withdraw)(\/|$)/.test(route)) return 'edit';
  // Whatever one fills in without an account to edit by: answers, figures, a password, a doubt.
  return /^\/(check|readings|sign-in|sign-up|reset|confirm)(\/|$)|\/doubt$/.test(route) ? 'check' : 'read';
}

function filesOf(key, rootFiles) {
  const manifest = `server/app${key}_client-reference-manifest.js`;
  if (!existsSync(join(dist, manifest))) return null;
  const sandbox = { globalThis: {} };
  vm.runInNewContext(read(manifest), sandbox);
  const [entry] = Object.values(sandbox.globalThis.__RSC_MANIFEST);
  const styles = Object.values(entry.entryCSSFiles ?? {}).flat();
  return {
    script: new Set([...rootFiles, ...Object.values(entry.entryJSFiles ?? {}).flat()]),
    styles: new Set(styles.map((file) => file.path)),
  };
}

const kb = (bytes) => `${(bytes / KB).toFixed(1)} kB`;
const over = [];
const allStyles = new Set();
const { rootMainFiles } = JSON.parse(read('build-manifest.json'));

console.log('route'.padEnd(40), 'kind '.padEnd(6), 'script beyond the framework'.padStart(28), 'styles'.padStart(10));
for (const [key, route] of Object.entries(JSON.parse(read('app-path-routes-manifest.json'))).sort()) {
  const files = key.endsWith('/page') ? filesOf(key, rootMainFiles) : null;
  if (files === null) continue;
  const kind = kindOf(route);
  const beyond = sum(files.script) - FRAMEWORK;
  for (const file of files.styles) allStyles.add(file);
  console.log(route.padEnd(40), kind.padEnd(6), kb(beyond).padStart(28), kb(sum(files.styles)).padStart(10));
  if (beyond > SCRIPT[kind]) over.push(`${route}: ${kb(beyond)} of script, at most ${kb(SCRIPT[kind])} for ${kind}`);
}
console.log(`All styles together: ${kb(sum(allStyles))} of ${kb(STYLES)}`);
if (sum(allStyles) > STYLES) over.push(`styles: ${kb(sum(allStyles))}, at most ${kb(STYLES)}`);

for (const line of over) console.error(`Over budget: ${line}`);
process.exitCode = over.length === 0 ? 0 : 1;
