import { join, resolve } from 'node:path';
import { build as bundleWith, type Plugin } from 'esbuild';

const folder = import.meta.dirname;
const LOCATE = resolve(folder, '../../core/diagnostics/locate.ts');
const STRICT = join(folder, 'fuzz-strict-locate.ts');

/** The worker's program as one text, with spans looked at on their way out of the core. */
export async function workerProgram(): Promise<string> {
  const watched = new Set<string>();
  const bundle = await bundleWith({
    entryPoints: [join(folder, 'fuzz-worker.ts')],
    bundle: true,
    write: false,
    platform: 'node',
    format: 'cjs',
    keepNames: true,
    logLevel: 'error',
    plugins: [strictLocate(watched)],
  });
  if (watched.size === 0) throw new Error('nothing in core/evaluate locates diagnostics any more: spans go unseen');
  const [program] = bundle.outputFiles;
  if (program === undefined) throw new Error('the worker gave no program');
  return program.text;
}

function strictLocate(watched: Set<string>): Plugin {
  return {
    name: 'strict-locate',
    setup(build) {
      build.onResolve({ filter: /\/locate\.ts$/ }, ({ path, resolveDir, importer }) => {
        if (resolve(resolveDir, path) !== LOCATE || !importer.includes(join('core', 'evaluate'))) return undefined;
        watched.add(importer);
        return { path: STRICT };
      });
    },
  };
}
