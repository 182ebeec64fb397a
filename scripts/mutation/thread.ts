import { pathToFileURL } from 'node:url';
import { Worker } from 'node:worker_threads';
import type { Order, Tried } from './inside';

const BOOT = `
const { workerData } = require('node:worker_threads');
globalThis.planted = workerData.planted;
import(workerData.bundle);
`;
const MEMORY = { maxOldGenerationSizeMb: 700 };

/** A thread that tries mutants, one after another. One that hangs or runs out of memory is given up and replaced. */
export class Thread {
  private worker: Worker | null = null;

  constructor(private readonly bundle: string) {}

  /** Answers with what came out, or null where one test took longer than so many milliseconds. */
  async try(order: Order, { ms, anew }: { ms: number; anew: boolean }): Promise<Tried | null> {
    if (anew) await this.stop();
    const tried = await ask(this.worker ?? this.begin(order), order, ms);
    if (tried === null || anew) await this.stop();
    return tried;
  }

  async stop(): Promise<void> {
    await this.worker?.terminate();
    this.worker = null;
  }

  private begin({ now, runs }: Order): Worker {
    const workerData = { planted: { now, runs }, bundle: pathToFileURL(this.bundle).href };
    this.worker = new Worker(BOOT, { eval: true, workerData, resourceLimits: MEMORY, execArgv: [] });
    return this.worker;
  }
}

function ask(worker: Worker, order: Order, ms: number): Promise<Tried | null> {
  return new Promise((resolve) => {
    const end = (result: Tried | null): void => {
      clearTimeout(timer);
      worker.off('message', hear);
      worker.off('error', giveUp);
      resolve(result);
    };
    const giveUp = (): void => {
      end(null);
    };
    /** The name of a test that begins, or the end of all. */
    const hear = (said: string | Tried): void => {
      if (typeof said === 'string') timer.refresh();
      else end(said);
    };
    // The first message takes as long as the bundle takes to load.
    const timer = setTimeout(giveUp, ms);
    worker.on('message', hear);
    worker.on('error', giveUp);
    worker.postMessage(order);
  });
}
