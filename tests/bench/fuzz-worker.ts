import { parentPort, workerData } from 'node:worker_threads';
import { runCase, type Setup } from './fuzz-case.ts';

/** Cases from `from` up to, not including, `to`. */
export interface Order {
  readonly from: number;
  readonly to: number;
}

const port = parentPort;
if (port === null) throw new Error('this file runs as a worker');
const setup = workerData as Setup;
const seen = new Set<string>();

port.on('message', ({ from, to }: Order) => {
  for (let index = from; index < to; index += 1) port.postMessage(runCase(setup, index, seen));
  port.postMessage('done');
});
