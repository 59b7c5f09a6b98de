import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, it } from 'vitest';
import { CORE_VERSION } from '../../core/version.ts';

it('the core records the version of the package', () => {
  const file = readFileSync(join(import.meta.dirname, '../../package.json'), 'utf8');
  expect((JSON.parse(file) as { version: string }).version).toBe(CORE_VERSION);
});
