import { availableParallelism } from 'node:os';
import { Worker } from 'node:worker_threads';
import { WORKER } from '../places.ts';
import { Refusal } from '../problem.ts';
import type { Answer, Outcome, Task } from './protocol.ts';

export interface EvaluatePool {
  /** Throws a Refusal when the sheet takes too much time or memory, or too many others wait. */
  readonly evaluate: (task: Task) => Promise<Outcome>;
  readonly stop: () => Promise<void>;
}

export interface PoolLimits {
  readonly threads: number;
  readonly seconds: number;
  readonly megabytes: number;
  readonly waiting: number;
}

const LIMITS: PoolLimits = {
  threads: Math.min(2, availableParallelism()),
  seconds: 10,
  megabytes: 256,
  waiting: 40,
};

interface Job {
  readonly task: Task;
  readonly resolve: (outcome: Outcome) => void;
  readonly reject: (cause: Error) => void;
}

/** Threads that are started when first needed, and kept. One that fails or runs too long is replaced. */
export function makeEvaluatePool(limits: Partial<PoolLimits> = {}): EvaluatePool {
  const { threads, seconds, megabytes, waiting } = { ...LIMITS, ...limits };
  const queue: Job[] = [];
  const idle: Worker[] = [];
  const all = new Set<Worker>();

  const next = (): void => {
    if (queue.length === 0) return;
    const ready = idle.pop();
    if (!ready && all.size >= threads) return;
    const job = queue.shift();
    if (!job) return;
    const worker = ready ?? start();
    void runJob(worker, job, ready !== undefined, seconds).then((isSound) => {
      if (isSound) idle.push(worker);
      else forget(worker);
      next();
    });
  };

  const start = (): Worker => {
    const worker = startWorker(megabytes);
    all.add(worker);
    return worker.once('exit', () => forget(worker));
  };

  const forget = (worker: Worker): void => {
    all.delete(worker);
    if (idle.includes(worker)) idle.splice(idle.indexOf(worker), 1);
  };

  return {
    evaluate: (task) =>
      new Promise((resolve, reject) => {
        if (queue.length >= waiting) {
          reject(new Refusal('busy', 'too many sheets wait to be evaluated; try again soon', { retryAfter: 5 }));
          return;
        }
        queue.push({ task, resolve, reject });
        next();
      }),
    stop: async () => {
      for (const job of queue.splice(0)) job.reject(new Refusal('busy', 'the server is stopping'));
      await Promise.all([...all].map((worker) => worker.terminate()));
    },
  };
}

function startWorker(megabytes: number): Worker {
  const worker = new Worker(WORKER, {
    resourceLimits: { maxOldGenerationSizeMb: megabytes, maxYoungGenerationSizeMb: 32, stackSizeMb: 4 },
  });
  worker.unref();
  return worker;
}

/** Gives one task to a worker. The result says whether the worker can be given another. */
function runJob(worker: Worker, job: Job, isReady: boolean, seconds: number): Promise<boolean> {
  return new Promise((done) => {
    let timer: NodeJS.Timeout | undefined;
    const settle = (isSound: boolean, act: () => void): void => {
      clearTimeout(timer);
      worker.off('message', onMessage).off('error', onError).off('exit', onExit);
      // A terminated thread may still report its end; nobody waits for that any more.
      if (!isSound) void worker.on('error', () => undefined).terminate();
      // First the pool takes the thread back, then the caller goes on: its next sheet finds the thread idle.
      done(isSound);
      act();
    };
    const stopped = (detail: string): void =>
      settle(false, () => job.reject(new Refusal('evaluation-stopped', detail)));
    const start = (): void => {
      // The time of starting the thread is not the sheet's.
      timer = setTimeout(() => stopped(`the sheet takes longer than ${seconds} s to evaluate`), seconds * 1000);
      worker.postMessage(job.task);
    };
    const onMessage = (message: Answer): void => {
      if (message.answer === 'ready') start();
      else if (message.answer === 'outcome') settle(true, () => job.resolve(message.outcome));
      else settle(false, () => job.reject(new Error(`the evaluation failed: ${message.message}`)));
    };
    const onError = (cause: Error & { readonly code?: string }): void => {
      if (cause.code === 'ERR_WORKER_OUT_OF_MEMORY') stopped('the sheet takes too much memory to evaluate');
      else settle(false, () => job.reject(cause));
    };
    const onExit = (): void => settle(false, () => job.reject(new Refusal('busy', 'the server is stopping')));
    worker.on('message', onMessage).on('error', onError).on('exit', onExit);
    if (isReady) start();
  });
}
