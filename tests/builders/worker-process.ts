import { spawn, type ChildProcess } from 'node:child_process';

export type WorkerProcess = {
  readonly child: ChildProcess;
  /** Its exit code, or the signal that ended it. */
  readonly ended: Promise<number | NodeJS.Signals>;
  /** Resolves when it says that it has begun. */
  readonly begun: Promise<void>;
};

/** A worker as `npm start` runs it, on this test's database. It ends with the test, however that ends. */
export function startWorkerProcess(mailUrl: string): WorkerProcess {
  const env = {
    ...process.env,
    TSX_TSCONFIG_PATH: '.ci/tsconfig.node.json',
    FOOTRING_MAIL_URL: mailUrl,
    DATABASE_OWNER_URL: '',
    NODE_ENV: 'production' as const,
    NODE_OPTIONS: '',
  };
  const child = spawn('setpriv', ['--pdeathsig', 'KILL', '--', process.execPath, '--import', 'tsx', 'scripts/worker.ts'], {
    env,
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  const ended = new Promise<number | NodeJS.Signals>((resolve) => {
    child.once('exit', (code, signal) => {
      resolve(code ?? signal ?? -1);
    });
  });
  const begun = new Promise<void>((resolve) => {
    child.stdout.on('data', (chunk: Buffer) => {
      if (chunk.includes('"doing":"work"')) resolve();
    });
  });
  return { child, ended, begun };
}
