import { open, readFile, rm, stat } from 'node:fs/promises';
import { createServer } from 'node:net';
import { join } from 'node:path';

export type Unlock = () => Promise<void>;

/** Another server has the data folder open. */
export class FolderInUseError extends Error {
  constructor(folder: string, cause?: unknown) {
    super(`the data folder ${folder} is in use by another Antinode server; stop it, or give this one its own folder`, {
      cause,
    });
    this.name = 'FolderInUseError';
  }
}

/**
 * Takes the data folder for this process. PGlite itself lets two processes open one folder, and rows of both are lost.
 * On Linux the lock is a socket without a file, named by the folder's identity: the system frees it however the process
 * ends. Elsewhere it is a file with the process's id.
 */
export async function lockFolder(folder: string): Promise<Unlock> {
  return process.platform === 'linux' ? lockBySocket(folder) : lockByFile(folder);
}

async function lockBySocket(folder: string): Promise<Unlock> {
  const { dev, ino } = await stat(folder, { bigint: true });
  const server = createServer((socket) => socket.destroy());
  await new Promise<void>((resolve, reject) => {
    server.once('error', (cause: NodeJS.ErrnoException) =>
      reject(cause.code === 'EADDRINUSE' ? new FolderInUseError(folder, cause) : cause),
    );
    server.listen({ path: `\0antinode-${dev}-${ino}` }, resolve);
  });
  server.unref();
  return () => new Promise((resolve) => server.close(() => resolve()));
}

/** Exported for its test, which runs on Linux too. */
export async function lockByFile(folder: string): Promise<Unlock> {
  const path = join(folder, 'server.lock');
  const file = await open(path, 'wx').catch(async (cause: NodeJS.ErrnoException) => {
    if (cause.code !== 'EEXIST') throw cause;
    if (isRunning(Number(await readFile(path, 'utf8')))) throw new FolderInUseError(folder, cause);
    // Left behind by a process that was killed. If two servers get here at once, `wx` lets only one go on.
    await rm(path, { force: true });
    return open(path, 'wx');
  });
  await file.writeFile(String(process.pid));
  await file.close();
  return () => rm(path, { force: true });
}

function isRunning(pid: number): boolean {
  if (!Number.isSafeInteger(pid) || pid <= 0) return false;
  try {
    process.kill(pid, 0);
    return true;
  } catch (cause) {
    // A process of somebody else may not be signalled, but it runs.
    return (cause as NodeJS.ErrnoException).code === 'EPERM';
  }
}
