import { join } from 'node:path';

/** This file stands at the top of `server/` in the sources, and is part of `dist/server/main.js` in the build. */
const here = import.meta.dirname;
const isBuilt = import.meta.filename.endsWith('.js');

export const PACKAGE_ROOT = isBuilt ? join(here, '../..') : join(here, '..');
export const MIGRATIONS = join(here, 'migrations');
export const WEB_ROOT = join(PACKAGE_ROOT, 'dist/web');
/** Always the built one: a thread does not inherit the loader with which sources run. */
export const WORKER = join(PACKAGE_ROOT, 'dist/server/evaluate-worker.js');
