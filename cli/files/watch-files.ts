import { watch, type FSWatcher } from 'node:fs';
import { basename, dirname, resolve } from 'node:path';
import type { ExitStatus } from '../exit-status.ts';
import type { Surroundings } from '../terminal.ts';

/** Editors write a file in several strokes; what follows within this is one change. */
const SETTLES_MS = 15;

const CLEAR_SCREEN = '\u001B[2J\u001B[3J\u001B[H';

/**
 * Does some work, and does it again whenever a file that it read has changed. Ends only with the program.
 *
 * @param work gives the names of the files that it read
 */
export async function watchFiles(
  work: () => Promise<readonly string[]>,
  { streams, cwd }: Surroundings,
): Promise<ExitStatus> {
  for (;;) {
    if (streams.outIsTerminal) streams.out(CLEAR_SCREEN);
    const files = await work();
    await nextChange(files.map((file) => resolve(cwd, file)));
  }
}

/** Folders are watched rather than files: many editors put a new file in the place of the old one. */
async function nextChange(paths: readonly string[]): Promise<void> {
  const watchers: FSWatcher[] = [];
  await new Promise<void>((changed) => {
    let settling: NodeJS.Timeout | undefined;
    for (const folder of new Set(paths.map((path) => dirname(path)))) {
      const names = new Set(paths.filter((path) => dirname(path) === folder).map((path) => basename(path)));
      const watcher = watch(folder, (_, name) => {
        if (name === null || !names.has(name)) return;
        clearTimeout(settling);
        settling = setTimeout(changed, SETTLES_MS);
      });
      watchers.push(watcher);
    }
  });
  for (const watcher of watchers) watcher.close();
}
