import { spawn, spawnSync } from 'node:child_process';
import { closeSync, openSync, readFileSync } from 'node:fs';
import { setTimeout as wait } from 'node:timers/promises';
import { Trouble, say } from './say.mjs';

const running = [];
const afterwards = [];
let stopping = false;
let tied;

/**
 * Starts a program in a group of its own, which ends with us even if we are killed outright. `as` names the user it runs as.
 * `lastSignal` is what it gets in that case: a half-done installation must not go on beside the next one, a database may tidy up.
 * A function put into `onDeath` of the answer is called when the program ends without our asking.
 */
export function begin(command, args, { as, env = {}, output = 'inherit', patienceMs = 10_000, lastSignal = 'KILL' } = {}) {
  const [file, ...rest] = [...tie(lastSignal, as), command, ...args];
  const child = spawn(file, rest, {
    detached: true,
    stdio: ['ignore', output, output],
    env: { ...process.env, ...(output === 'inherit' ? {} : { NO_COLOR: '1', FORCE_COLOR: '0' }), ...env },
  });
  const started = { child, patienceMs, over: false, wanted: false, onDeath: undefined };
  started.ended = new Promise((resolve) => {
    child.once('error', (error) => resolve({ code: 127, error }));
    child.once('exit', (code, signal) => resolve({ code: code ?? 128, signal }));
  }).then((end) => {
    started.over = true;
    signal(started, 'SIGKILL'); // helpers that outlived their leader
    running.splice(running.indexOf(started), 1);
    if (!stopping && !started.wanted) started.onDeath?.(end.code);
    return end;
  });
  running.push(started);
  return started;
}

/** Runs a program to its end. Its output goes to `log` when one is named, else to the terminal. Answers with its exit code. */
export async function run(command, args, { log, limitMs = 40 * 60_000, ...options } = {}) {
  const output = log === undefined ? 'inherit' : openSync(log, 'w', 0o600);
  const started = begin(command, args, { ...options, output });
  if (log !== undefined) closeSync(output);
  const limit = setTimeout(() => signal(started, 'SIGKILL'), limitMs);
  const { code } = await started.ended;
  clearTimeout(limit);
  if (stopping) await new Promise(() => undefined); // we ended it ourselves: nothing more to say
  return code;
}

/** Runs a program whose failure ends the whole start; then the end of its log is shown below `failure`. */
export async function must(failure, command, args, options) {
  const code = await run(command, args, options);
  if (code === 0) return;
  throw new Trouble(`${failure}\n${options.log === undefined ? '' : `The end of ${options.log}:\n\n${endOf(options.log)}`}`);
}

/** Ends one program politely, then by force. */
export async function end(started) {
  if (started.over) return;
  started.wanted = true;
  signal(started, 'SIGTERM');
  await Promise.race([started.ended, wait(started.patienceMs, undefined, { ref: false })]);
  signal(started, 'SIGKILL');
  await started.ended;
}

/** Ends all that was started, the newest first, runs what `atTheEnd` asked for, and leaves with `code`. */
export async function stop(code) {
  if (stopping) return;
  stopping = true;
  for (const started of [...running].reverse()) await end(started);
  for (const work of [...afterwards].reverse()) work();
  process.exit(code);
}

/** Registers tidying that must happen however we end, unless we are killed outright. */
export function atTheEnd(work) {
  afterwards.push(work);
}

/** Makes Ctrl-C, a closed terminal and SIGTERM stop everything; a second Ctrl-C does not wait for anybody. */
export function stopOnSignals() {
  let asked = 0;
  for (const [name, code] of Object.entries({ SIGINT: 130, SIGTERM: 143, SIGHUP: 129 })) {
    process.on(name, () => {
      // Under npm a Ctrl-C arrives twice, from the terminal and from npm; only a later one is meant as a second.
      if (asked > 0 && Date.now() - asked > 800) {
        for (const started of running) signal(started, 'SIGKILL');
        process.exit(code);
      }
      if (asked === 0) say('\nStopping.');
      asked ||= Date.now();
      void stop(code);
    });
  }
  if (process.env.npm_lifecycle_event !== undefined) followParent();
}

/** The last lines of a log file. */
export function endOf(file, lines = 15) {
  try {
    return readFileSync(file, 'utf8').trimEnd().split('\n').slice(-lines).join('\n');
  } catch {
    return '(no log was written)';
  }
}

// npm killed outright cannot pass the signal on. Were we to live, the port would stay taken by a site nobody sees.
function followParent() {
  const parent = process.ppid;
  setInterval(() => {
    if (process.ppid !== parent) void stop(143);
  }, 300).unref();
}

function signal(started, name) {
  try {
    process.kill(-started.child.pid, name);
  } catch {
    // It is gone already.
  }
}

// setpriv changes the user first: the tie to our life is lost by a change of user.
function tie(lastSignal, as) {
  tied ??= spawnSync('setpriv', ['--pdeathsig', 'TERM', '--', 'true']).status === 0;
  if (!tied) return [];
  const user = as === undefined ? [] : ['--reuid', as, '--regid', as, '--clear-groups'];
  return ['setpriv', '--pdeathsig', lastSignal, ...user, '--'];
}
