import { mkdirSync, mkdtempSync, writeFileSync } from 'node:fs';
import { availableParallelism, tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import type { EvaluateRequest } from '../../core/evaluate/request.ts';
import { kindOf, type CaseResult, type Failure } from './fuzz-case.ts';
import { runPool } from './fuzz-pool.ts';
import { workerProgram } from './fuzz-program.ts';
import type { Order } from './fuzz-worker.ts';
import { readCorpus } from './mutate/corpus.ts';
import { mutatedRequest } from './mutate/mutated-request.ts';

export interface FuzzOptions {
  readonly sheets: number;
  readonly seed: number;
  /** No evaluation may take longer. */
  readonly limitMs: number;
  /** Runs this case alone. */
  readonly only?: number;
}

const CHUNK = 100;
const HANG_MS = 30_000;
const TELL_EVERY = 20_000;

/** Evaluates mutated sheets and says what is wrong with any of the answers. Gives the number of failures. */
export async function fuzz({ sheets, seed, limitMs, only }: FuzzOptions): Promise<number> {
  const corpus = readCorpus();
  const threads = only === undefined ? availableParallelism() : 1;
  console.log(`fuzz: ${corpus.length} sheets to start from, ${threads} threads, --seed ${seed}`);
  const record = new Record(seed, (index) => mutatedRequest(corpus, seed, index));
  await runPool({
    program: await workerProgram(),
    setup: { corpus, seed, limitMs },
    threads,
    orders: only === undefined ? ordersFor(sheets) : [{ from: only, to: only + 1 }],
    hangMs: HANG_MS,
    onResult: (result) => record.take(result),
    onLost: (index, why) => record.takeLost(index, why),
  });
  record.tell();
  return record.failures;
}

function ordersFor(sheets: number): Order[] {
  return Array.from({ length: Math.ceil(sheets / CHUNK) }, (_, i) => ({
    from: i * CHUNK,
    to: Math.min(sheets, (i + 1) * CHUNK),
  }));
}

/** What a run has come to so far. */
class Record {
  failures = 0;
  private count = 0;
  private reports = 0;
  private slowest = { ms: 0, index: 0 };
  private folder = '';
  private readonly kinds = new Map<string, number>();
  private readonly start = performance.now();
  private readonly seed: number;
  private readonly requestOf: (index: number) => EvaluateRequest;

  constructor(seed: number, requestOf: (index: number) => EvaluateRequest) {
    this.seed = seed;
    this.requestOf = requestOf;
  }

  take({ index, ms, hasReport, failure }: CaseResult): void {
    this.count += 1;
    if (hasReport) this.reports += 1;
    if (ms > this.slowest.ms) this.slowest = { ms, index };
    if (failure !== undefined) this.fail(index, failure);
    if (this.count % TELL_EVERY === 0) console.log(`fuzz: ${this.count} sheets, ${this.rate()}`);
  }

  takeLost(index: number, why: string): void {
    this.count += 1;
    this.fail(index, { faults: [why], request: this.requestOf(index) });
  }

  tell(): void {
    for (const [kind, times] of this.kinds) console.log(`fuzz: ${times} × ${kind}`);
    const share = ((100 * this.reports) / Math.max(1, this.count)).toFixed(0);
    console.log(`fuzz: ${this.rate()}, ${share} % gave a report, the slowest is --case ${this.slowest.index}`);
    console.log(`fuzz: ${this.count} sheets, ${this.failures} failures, slowest ${this.slowest.ms.toFixed(0)} ms`);
  }

  private rate(): string {
    return `${((1000 * this.count) / (performance.now() - this.start)).toFixed(0)} sheets/s`;
  }

  /** The first of a kind is shown and kept; of the others it is enough to know how many there are. */
  private fail(index: number, { faults, request, shortest }: Failure): void {
    this.failures += 1;
    const kind = kindOf(faults[0] ?? '');
    const times = this.kinds.get(kind) ?? 0;
    this.kinds.set(kind, times + 1);
    if (times > 0) return;
    this.folder ||= mkdtempSync(join(tmpdir(), `antinode-fuzz-${this.seed}-`));
    const place = join(this.folder, String(index));
    keep(join(place, 'whole'), request, faults);
    if (shortest !== undefined) keep(join(place, 'shortest'), shortest, faults);
    console.log(`fuzz: case ${index} ${faults.join('; ')}\n      ${place}`);
  }
}

/** As files to look at and run, and as JSON, which also holds what UTF-8 cannot. */
function keep(folder: string, request: EvaluateRequest, faults: readonly string[]): void {
  for (const { name, text } of request.files) {
    const path = join(folder, name.replaceAll('..', 'up'));
    mkdirSync(dirname(path), { recursive: true });
    writeFileSync(path, text);
  }
  writeFileSync(join(folder, 'request.json'), JSON.stringify({ faults, ...request }, null, 2));
}
