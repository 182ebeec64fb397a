import { spawn, type ChildProcess } from 'node:child_process';
import { createServer, type AddressInfo } from 'node:net';

export type SiteProcess = {
  readonly address: string;
  readonly child: ChildProcess;
  /** Its exit code, or the signal that ended it. */
  readonly ended: Promise<number | NodeJS.Signals>;
  /** All that it wrote so far. */
  readonly log: () => string;
};

function freePort(): Promise<number> {
  return new Promise((resolve) => {
    const server = createServer().listen(0, '127.0.0.1', () => {
      const { port } = server.address() as AddressInfo;
      server.close(() => {
        resolve(port);
      });
    });
  });
}

async function answers(address: string): Promise<boolean> {
  try {
    return (await fetch(`${address}/api/health`)).ok;
  } catch {
    return false;
  }
}

/** One more web process of the build under test, on the same database and under the same name as the others. It ends with the test. */
export async function startSiteProcess(settings: Readonly<Record<string, string>> = {}): Promise<SiteProcess> {
  const port = await freePort();
  const env = {
    ...process.env,
    ...settings,
    PORT: String(port),
    NODE_ENV: 'production' as const,
    NODE_OPTIONS: '',
    DATABASE_OWNER_URL: '',
  };
  const next = [process.execPath, 'node_modules/next/dist/bin/next', 'start', '-p', String(port)];
  const child = spawn('setpriv', ['--pdeathsig', 'KILL', '--', ...next], { env, stdio: ['ignore', 'pipe', 'pipe'] });
  const written: Buffer[] = [];
  for (const output of [child.stdout, child.stderr]) output.on('data', (piece: Buffer) => written.push(piece));
  const log = (): string => Buffer.concat(written).toString('utf8');
  const life = { over: false };
  const ended = new Promise<number | NodeJS.Signals>((resolve) => {
    child.once('exit', (code, signal) => {
      life.over = true;
      resolve(code ?? signal ?? -1);
    });
  });
  const address = `http://127.0.0.1:${String(port)}`;
  while (!life.over && !(await answers(address))) await new Promise((resolve) => setTimeout(resolve, 100));
  if (life.over) throw new Error(`A further site did not start:\n${log().slice(-2000)}`);
  return { address, child, ended, log };
}
