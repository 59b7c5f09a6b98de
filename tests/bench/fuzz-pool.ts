import { Worker } from 'node:worker_threads';
import type { CaseResult, Setup } from './fuzz-case.ts';
import type { Order } from './fuzz-worker.ts';

const LOOK_EVERY_MS = 500;
const MEMORY_MB = 1500;

export interface PoolOptions {
  /** Text of the worker's program. */
  readonly program: string;
  readonly setup: Omit<Setup, 'progress'>;
  readonly threads: number;
  /** What is to be run; taken from the front, one by one, by whichever thread is free. */
  readonly orders: Order[];
  /** An evaluation that runs for longer is given up, and its worker with it. */
  readonly hangMs: number;
  readonly onResult: (result: CaseResult) => void;
  /** A case that did not end, or ended its worker. */
  readonly onLost: (index: number, why: string) => void;
}

/** Runs all orders on all threads. */
export async function runPool(options: PoolOptions): Promise<void> {
  await Promise.all(Array.from({ length: options.threads }, () => runThread(options)));
}

/** A thread is one worker, and another one whenever the last was lost. */
async function runThread(options: PoolOptions): Promise<void> {
  while (options.orders.length > 0) await runWorker(options);
}

function runWorker(options: PoolOptions): Promise<void> {
  const progress = new SharedArrayBuffer(8);
  const counters = new Int32Array(progress);
  const worker = new Worker(options.program, {
    eval: true,
    execArgv: [],
    workerData: { ...options.setup, progress } satisfies Setup,
    resourceLimits: { maxOldGenerationSizeMb: MEMORY_MB },
  });
  let order: Order | undefined;
  return new Promise((resolve) => {
    const end = (): void => {
      clearInterval(watch);
      worker.removeAllListeners();
      void worker.terminate().then(() => resolve());
    };
    const lose = (why: string): void => {
      const index = Atomics.load(counters, 0);
      options.onLost(index, why);
      if (order !== undefined && index + 1 < order.to) options.orders.unshift({ from: index + 1, to: order.to });
      end();
    };
    const giveNext = (): void => {
      order = options.orders.shift();
      if (order === undefined) return end();
      Atomics.store(counters, 0, order.from);
      worker.postMessage(order);
    };
    const watch = watchFor(
      () => Atomics.load(counters, 1),
      options.hangMs,
      () => lose(`does not end within ${options.hangMs / 1000} s`),
    );
    worker.on('message', (message: CaseResult | 'done') => {
      if (message === 'done') giveNext();
      else options.onResult(message);
    });
    worker.on('error', (cause) => lose(`ends its worker: ${cause instanceof Error ? cause.message : String(cause)}`));
    giveNext();
  });
}

/** Calls `stalled` once `read` has given the same number for too long. */
function watchFor(read: () => number, hangMs: number, stalled: () => void): NodeJS.Timeout {
  let last = read();
  let since = performance.now();
  return setInterval(() => {
    const now = read();
    if (now === last && performance.now() - since > hangMs) stalled();
    if (now === last) return;
    last = now;
    since = performance.now();
  }, LOOK_EVERY_MS);
}
