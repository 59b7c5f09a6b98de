import { spawn, type ChildProcess } from 'node:child_process';
import { writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { afterEach, beforeAll, describe, expect, it } from 'vitest';
import { ensureBuilt, makeWorkplace, ROOT } from './harness.ts';

const place = makeWorkplace();
let watching: ChildProcess | undefined;

beforeAll(ensureBuilt, 120_000);

afterEach(() => {
  watching?.kill('SIGINT');
});

const sheet = (bore: string): string =>
  [
    'antinode: sheet/1',
    'number: T-1',
    'title: Watched',
    'units: us',
    'use: [basis.yaml]',
    `inputs: { D: { value: ${bore}, source: b } }`,
    'sections: [{ title: S, steps: { A: "pi/4*D^2 to in^2", F: q*A to lbf } }]',
  ].join('\n');

const basis = (q: string): string =>
  ['antinode: definitions/1', 'sources: { b: Basis }', `inputs: { q: { value: ${q}, source: b } }`].join('\n');

/** Waits until the program has written something that matches, and forgets all before it. */
class Reader {
  private text = '';
  private readonly child: ChildProcess;

  constructor(child: ChildProcess) {
    this.child = child;
    child.stdout?.setEncoding('utf8').on('data', (text: string) => (this.text += text));
    child.stderr?.setEncoding('utf8').on('data', (text: string) => (this.text += text));
  }

  async until(pattern: RegExp): Promise<string> {
    for (let waited = 0; waited < 20_000; waited += 10) {
      const match = pattern.exec(this.text);
      if (match !== null) {
        this.text = this.text.slice(match.index + match[0].length);
        return match[0];
      }
      if (this.child.exitCode !== null) throw new Error(`ended: ${this.text}`);
      await new Promise((resolve) => setTimeout(resolve, 10));
    }
    throw new Error(`not written: ${String(pattern)} in ${this.text}`);
  }
}

describe('run --watch', () => {
  it('evaluates again when the sheet, or a file that it uses, is saved', async () => {
    await place.write('basis.yaml', basis('10 psi'));
    await place.write('sheet.yaml', sheet('2 in'));
    watching = spawn(process.execPath, [join(ROOT, 'dist/cli/main.js'), 'run', 'sheet.yaml', '--watch'], {
      cwd: place.folder,
      env: { HOME: place.folder },
    });
    const reader = new Reader(watching);
    // 10 psi on π/4·2² in² are 31.42 lbf; on a bore of 4 in, 125.7; with 20 psi, 251.3.
    await reader.until(/F = .* = 31\.42 lbf[\s\S]*waiting for changes/);
    await place.write('sheet.yaml', sheet('4 in'));
    await reader.until(/F = .* = 125\.7 lbf[\s\S]*waiting for changes/);
    await writeFile(join(place.folder, 'basis.yaml'), basis('20 psi'));
    await reader.until(/F = .* = 251\.3 lbf[\s\S]*waiting for changes/);
    await place.write('sheet.yaml', sheet('4 inn'));
    await reader.until(/UNIT_UNKNOWN[\s\S]*waiting for changes/);
    await place.write('sheet.yaml', sheet('4 in'));
    await reader.until(/F = .* = 251\.3 lbf/);
  }, 60_000);

  it('has nothing to watch on standard input', async () => {
    const { status, err } = await place.cli(['run', '-', '--watch']);
    expect(status).toBe(3);
    expect(err).toContain('standard input cannot be watched');
  });
});
