import { checkRoom, ensurePackages, roomNeeded } from './machine/packages.mjs';
import { stop, stopOnSignals } from './machine/processes.mjs';
import { CHROMIUM, MARIADB, ensurePrograms } from './machine/programs.mjs';
import { Trouble, duration, say, tell } from './machine/say.mjs';
import * as settings from './machine/settings.mjs';
import { STEPS, prepare } from './machine/test-steps.mjs';

/** The steps named on the command line, or all of them but the long ones. */
function chosen(names) {
  const strange = names.filter((name) => !STEPS.some((step) => step.name === name));
  if (strange.length > 0) {
    throw new Trouble(`There is no step ${strange.join(', ')}. The steps are: ${STEPS.map(({ name }) => name).join(', ')}.`);
  }
  return STEPS.filter(({ name, onlyWhenNamed }) => (names.length === 0 ? onlyWhenNamed !== true : names.includes(name)));
}

/** Makes sure of all that the steps need, from a bare machine on. */
async function ready(steps) {
  settings.checkNode();
  await settings.holdAlone('test', `process ${process.pid}`);
  settings.makeDataFolder();
  checkRoom(settings.dataFolder, roomNeeded() + 500);
  const needs = (what) => steps.some((step) => step.needs?.includes(what));
  await ensurePrograms([...(needs('database') ? [MARIADB] : []), ...(needs('browser') ? [CHROMIUM] : [])]);
  await ensurePackages();
  await prepare();
}

async function take(step) {
  say(`\n── ${step.name} ${'─'.repeat(60 - step.name.length)}`);
  const began = Date.now();
  try {
    return { ...(await step.work()), ms: Date.now() - began };
  } catch (error) {
    tell(error);
    return { passed: 0, failed: 1, ms: Date.now() - began };
  }
}

/** Takes the steps in their order and stops at the first that fails. Answers with what became of each. */
async function takeAll(steps) {
  const results = new Map();
  for (const step of steps) {
    const result = await take(step);
    results.set(step.name, result);
    say(`${step.name}: ${result.failed === 0 ? 'passed' : 'FAILED'}, ${duration(result.ms)}`);
    if (result.failed > 0) break;
  }
  return results;
}

function summary(steps, results) {
  say(`\n── Summary ${'─'.repeat(53)}`);
  for (const { name } of steps) {
    const result = results.get(name);
    const words = result === undefined ? 'not run' : `${result.passed} passed, ${result.failed} failed`.padEnd(28) + duration(result.ms);
    say(`${name.padEnd(12)}${words}`);
  }
  say();
}

process.chdir(settings.root);
process.umask(0o022);
stopOnSignals();
let passed = 0;
let failed = 0;
try {
  const steps = chosen(process.argv.slice(2));
  await ready(steps);
  const results = await takeAll(steps);
  summary(steps, results);
  for (const result of results.values()) {
    passed += result.passed;
    failed += result.failed;
  }
} catch (error) {
  tell(error);
  failed += 1;
}
say(`${passed} passed, ${failed} failed`);
await stop(failed === 0 ? 0 : 1);
