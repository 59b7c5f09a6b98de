import type { EvaluateRequest } from '../../core/evaluate/request.ts';
import { examine, type Examined } from './fuzz-check.ts';
import { minimise } from './fuzz-minimise.ts';
import type { Sheet } from './mutate/corpus.ts';
import { mutatedRequest } from './mutate/mutated-request.ts';

/** What the worker is given when it starts. */
export interface Setup {
  readonly corpus: readonly Sheet[];
  readonly seed: number;
  readonly limitMs: number;
  /** Two numbers of 32 bits: the index of the case that runs, and how many evaluations have begun. */
  readonly progress: SharedArrayBuffer;
}

export interface Failure {
  readonly faults: readonly string[];
  readonly request: EvaluateRequest;
  /** The same fault with as little text as it takes; only for the first of its kind. */
  readonly shortest?: EvaluateRequest;
}

export interface CaseResult {
  readonly index: number;
  readonly ms: number;
  readonly hasReport: boolean;
  readonly failure?: Failure;
}

const MINIMISE_MS = 8000;
const TOO_SLOW = 'takes too long';

/** Makes one case, evaluates it and, where it fails in a way not seen before, looks for a shorter sheet that fails alike. */
export function runCase(setup: Setup, index: number, seen: Set<string>): CaseResult {
  Atomics.store(new Int32Array(setup.progress), 0, index);
  const request = mutatedRequest(setup.corpus, setup.seed, index);
  const { faults, ms, hasReport } = faultsOf(request, setup);
  const [first] = faults;
  if (first === undefined) return { index, ms, hasReport };
  const kind = kindOf(first);
  // What is slow takes too long to be made shorter, too.
  if (seen.has(kind) || kind.startsWith(TOO_SLOW)) return { index, ms, hasReport, failure: { faults, request } };
  seen.add(kind);
  return { index, ms, hasReport, failure: { faults, request, shortest: shortened(request, kind, setup) } };
}

/** A fault without its numbers and names, so that the same mistake in a thousand sheets counts once. */
export function kindOf(fault: string): string {
  return fault
    .replace(/^(throws \w+): .* at (\S+) .*$/s, '$1 in $2')
    .replace(/[`'"].*?[`'"]/g, '…')
    .replace(/quantities\.[^.]+/, 'quantities.…')
    .replace(/\d+(\.\d+)?/g, '0');
}

function faultsOf(request: EvaluateRequest, { limitMs, progress }: Setup): Examined {
  Atomics.add(new Int32Array(progress), 1, 1);
  let examined = examine(request);
  // A busy machine may halt any process for a while: what is slow is slow every time.
  for (let again = 0; again < 3 && examined.ms > limitMs; again += 1) examined = examine(request);
  if (examined.ms <= limitMs) return examined;
  return { ...examined, faults: [...examined.faults, `${TOO_SLOW}: ${examined.ms.toFixed(0)} ms`] };
}

function shortened(request: EvaluateRequest, kind: string, setup: Setup): EvaluateRequest {
  const failsAlike = (candidate: EvaluateRequest): boolean =>
    faultsOf(candidate, setup).faults.some((fault) => kindOf(fault) === kind);
  const plain = { entry: request.entry, files: request.files };
  let shortest = failsAlike(plain) ? plain : request;
  for (const { name } of request.files) {
    const withText = (text: string): EvaluateRequest => ({
      ...shortest,
      files: shortest.files.map((file) => (file.name === name ? { name, text } : file)),
    });
    const text = shortest.files.find((file) => file.name === name)?.text ?? '';
    shortest = withText(minimise(text, (candidate) => failsAlike(withText(candidate)), MINIMISE_MS));
  }
  return shortest;
}
