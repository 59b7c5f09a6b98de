import { execFileSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';

const root = join(import.meta.dirname, '../..');

/** Text files that git tracks; data, lock file and images are not prose. */
function trackedFiles(): string[] {
  return execFileSync('git', ['ls-files', '-z'], { cwd: root, encoding: 'utf8' })
    .split('\0')
    .filter((path) => /\.(ts|tsx|js|css|html|md|yaml|json|sh)$/.test(path) && path !== 'package-lock.json');
}

describe('the sources', () => {
  it('name no registry host and no path of a machine', () => {
    const pattern = new RegExp(
      ['https?://[a-z0-9.-]*registry', '/wor' + 'k/', '/ho' + 'me/[a-z]', '/tm' + 'p/[a-z]'].join('|'),
    );
    const offending = trackedFiles().filter((path) => pattern.test(readFileSync(join(root, path), 'utf8')));
    expect(offending).toEqual([]);
  });
});
