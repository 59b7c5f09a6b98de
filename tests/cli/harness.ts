import { spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { mkdir, readFile, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll } from 'vitest';
import { runCli } from '../../cli/program.ts';

/** How a command ended, and what it wrote. */
export interface Ended {
  readonly status: number;
  readonly out: string;
  readonly err: string;
}

export interface CommandOptions {
  readonly env?: Readonly<Record<string, string>>;
  readonly stdin?: string | Uint8Array;
  /** Whether each stream is a terminal; neither is, where nothing is said. */
  readonly outIsTerminal?: boolean;
  readonly errIsTerminal?: boolean;
  /** Called with all that the command has written to `err` so far. */
  readonly onErr?: (sofar: string) => void;
}

/** A folder of its own in which commands run, gone after the tests of the file. */
export interface Workplace {
  readonly folder: string;
  readonly write: (name: string, content: string | Uint8Array) => Promise<string>;
  readonly read: (name: string) => Promise<string>;
  readonly cli: (args: readonly string[], options?: CommandOptions) => Promise<Ended>;
}

export function makeWorkplace(): Workplace {
  const folder = mkdtempSync(join(tmpdir(), 'antinode-cli-'));
  afterAll(() => rmSync(folder, { recursive: true, force: true }));
  return {
    folder,
    write: async (name, content) => {
      const path = join(folder, name);
      await mkdir(dirname(path), { recursive: true });
      await writeFile(path, content);
      return path;
    },
    read: (name) => readFile(join(folder, name), 'utf8'),
    cli: (args, options) => runInProcess(args, folder, options),
  };
}

async function runInProcess(args: readonly string[], cwd: string, options: CommandOptions = {}): Promise<Ended> {
  const written = { out: '', err: '' };
  const { stdin = '', onErr, outIsTerminal = false, errIsTerminal = false } = options;
  const status = await runCli(args, {
    streams: {
      out: (text) => void (written.out += text),
      err: (text) => {
        written.err += text;
        onErr?.(written.err);
      },
      outIsTerminal,
      errIsTerminal,
      readStdin: () => Promise.resolve(typeof stdin === 'string' ? new TextEncoder().encode(stdin) : stdin),
    },
    // Nothing of the machine's own environment, so that a sign-in of the person who runs the tests is out of reach.
    env: { HOME: cwd, ...options.env },
    cwd,
  });
  return { status, ...written };
}

export const ROOT = fileURLToPath(new URL('../..', import.meta.url));
export const EXAMPLE = join(ROOT, 'examples/tarn-hollow/discharge-run-force.yaml');
const BUILT_MAIN = join(ROOT, 'dist/cli/main.js');

/** Makes the build, unless it is newer than the sources. */
export async function ensureBuilt(): Promise<void> {
  const tsx = join(ROOT, 'node_modules/.bin/tsx');
  const { status, err } = await runProcess(tsx, [join(ROOT, '.build/build.ts'), '--if-stale'], ROOT);
  if (status !== 0) throw new Error(`the build failed: ${err}`);
}

/** Runs the built program as a shell would. */
export function runBuilt(args: readonly string[], cwd: string): Promise<Ended> {
  return runProcess(process.execPath, [BUILT_MAIN, ...args], cwd);
}

/** Runs the built program with a reader that closes the pipe after some bytes; the status is that of the program. */
export function runBuiltInto(reader: string, args: readonly string[], cwd: string): Promise<Ended> {
  const pipe = `set -o pipefail; "$0" "$@" | ${reader}`;
  return runProcess('bash', ['-c', pipe, process.execPath, BUILT_MAIN, ...args], cwd);
}

function runProcess(file: string, args: readonly string[], cwd: string): Promise<Ended> {
  return new Promise((resolve, reject) => {
    const written = { out: '', err: '' };
    const child = spawn(file, args, {
      cwd,
      env: { PATH: process.env['PATH'], HOME: cwd },
      stdio: ['ignore', 'pipe', 'pipe'],
    });
    child.stdout.setEncoding('utf8').on('data', (text: string) => (written.out += text));
    child.stderr.setEncoding('utf8').on('data', (text: string) => (written.err += text));
    child.once('error', reject);
    child.once('close', (code) => resolve({ status: code ?? -1, ...written }));
  });
}
