import { execFileSync } from 'node:child_process';
import { join } from 'node:path';
import { median } from './median.ts';
import type { Line } from './main.ts';

const root = join(import.meta.dirname, '../..');
const RUNS = 21;

const COMMANDS = {
  floor: ['-e', '0'],
  version: ['dist/cli/main.js', '--version'],
  run: ['dist/cli/main.js', 'run', 'examples/tarn-hollow/discharge-run-force.yaml'],
};

/** Start-up of the built command line against an empty Node process. The commands take turns, so that a busy machine slows all alike. */
export async function benchStartup(): Promise<Line[]> {
  const times = { floor: [] as number[], version: [] as number[], run: [] as number[] };
  for (let i = 0; i <= RUNS; i += 1) {
    for (const name of ['floor', 'version', 'run'] as const) {
      const ms = timeCommand(COMMANDS[name]);
      if (i > 0) times[name].push(ms);
    }
  }
  const floor = median(times.floor);
  const line = (what: string, ms: number, goal: string): Line => ({
    what,
    measured: `${ms.toFixed(0)} ms`,
    ratio: `${(ms / floor).toFixed(2)} × node -e 0 (${floor.toFixed(0)} ms)`,
    goal,
  });
  return Promise.resolve([
    line('antinode --version', median(times.version), '≤ 1.6 × (100 ms where the floor is 62 ms)'),
    line('antinode run, example', median(times.run), '≤ 4.0 × (250 ms where the floor is 62 ms)'),
  ]);
}

function timeCommand(args: readonly string[]): number {
  const start = performance.now();
  execFileSync(process.execPath, args, { cwd: root, stdio: 'ignore' });
  return performance.now() - start;
}
