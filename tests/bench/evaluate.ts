import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { evaluateSheet } from '../../core/evaluate/evaluate-sheet.ts';
import { median } from './median.ts';
import type { Line } from './main.ts';

const file = join(import.meta.dirname, '../../examples/tarn-hollow/discharge-run-force.yaml');

/** The whole way from text to report, warm, in one process. */
export function benchEvaluate(): Promise<Line[]> {
  const text = readFileSync(file, 'utf8');
  const request = { entry: 'sheet.yaml', files: [{ name: 'sheet.yaml', text }] };
  const times = Array.from({ length: 60 }, () => {
    const start = performance.now();
    evaluateSheet(request);
    return performance.now() - start;
  }).slice(20);
  const perRun = median(times);
  return Promise.resolve([
    {
      what: 'evaluate the example, text to report (warm)',
      measured: `${perRun.toFixed(2)} ms`,
      ratio: '',
      goal: 'no goal in this version',
    },
  ]);
}
