/**
 * Builds everything that runs: schema validators, the command line, the server with its evaluation worker, the report
 * stylesheet, and the web viewer. `--if-stale` does nothing when no source is newer than the last build.
 */
import { cp, mkdir, readdir, rm, stat, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { build as esbuild, type BuildOptions } from 'esbuild';
import { build as viteBuild } from 'vite';
import { buildReportCss } from './report-css.ts';
import { compileSchemas } from './schemas.ts';

const root = join(import.meta.dirname, '..');
const stamp = join(root, 'dist', '.built');
const SOURCES = [
  '.build',
  'cli',
  'core',
  'schemas',
  'server',
  'web',
  'package.json',
  'package-lock.json',
  'vite.config.ts',
];

// Packages of CommonJS that are inlined into an ES module still call `require`.
const REQUIRE =
  "import{createRequire as antinodeRequire}from'node:module';const require=antinodeRequire(import.meta.url);";

const node: BuildOptions = {
  absWorkingDir: root,
  bundle: true,
  platform: 'node',
  target: 'node20',
  format: 'esm',
  logLevel: 'warning',
  jsx: 'automatic',
  define: { 'process.env.NODE_ENV': '"production"' },
};

async function buildAll(): Promise<void> {
  await compileSchemas();
  await mkdir(join(root, 'dist'), { recursive: true });
  await Promise.all([buildCli(), buildServer(), buildReportCss()]);
  await viteBuild({ configFile: join(root, 'vite.config.ts'), logLevel: 'warn' });
  await writeFile(stamp, new Date().toISOString());
}

async function buildCli(): Promise<void> {
  // Names of chunks carry a digest, so those of earlier builds would stay.
  await rm(join(root, 'dist/cli'), { recursive: true, force: true });
  await esbuild({
    ...node,
    entryPoints: ['cli/main.ts'],
    outdir: 'dist/cli',
    splitting: true,
    minify: true,
    banner: { js: REQUIRE },
    // The server is its own bundle; the command `serve` loads it when it is called.
    external: ['../server/main.js'],
  });
}

async function buildServer(): Promise<void> {
  await esbuild({
    ...node,
    entryPoints: ['server/main.ts'],
    outdir: 'dist/server',
    packages: 'external',
    sourcemap: true,
  });
  // With its packages inlined, a thread starts in a tenth of the time.
  await esbuild({
    ...node,
    entryPoints: { 'evaluate-worker': 'server/evaluate/worker.ts' },
    outdir: 'dist/server',
    banner: { js: REQUIRE },
  });
  await cp(join(root, 'server/migrations'), join(root, 'dist/server/migrations'), { recursive: true });
}

async function isStale(): Promise<boolean> {
  const built = await modified(stamp);
  if (built === 0) return true;
  const newest = await Promise.all(SOURCES.map((source) => newestIn(join(root, source))));
  return Math.max(...newest) > built;
}

async function newestIn(path: string): Promise<number> {
  const own = await modified(path);
  const entries = await readdir(path, { withFileTypes: true }).catch(() => []);
  const inside = await Promise.all(
    entries.filter((entry) => entry.name !== 'generated').map((entry) => newestIn(join(path, entry.name))),
  );
  return Math.max(own, ...inside);
}

async function modified(path: string): Promise<number> {
  return stat(path).then(
    (found) => (found.isDirectory() ? 0 : found.mtimeMs),
    () => 0,
  );
}

if (!process.argv.includes('--if-stale') || (await isStale())) {
  const start = performance.now();
  await buildAll();
  console.error(`built in ${((performance.now() - start) / 1000).toFixed(1)} s`);
}
