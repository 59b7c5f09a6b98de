import { execFileSync } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { brotliDecompressSync } from 'node:zlib';
import packaged from '@sparticuz/chromium';
import { chromium, type Browser } from 'playwright-core';

const SYSTEM = ['/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome'];

// The package's own arguments say --single-process, with which closing a page ends the browser.
const ARGUMENTS = [
  '--headless',
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

/** Starts a Chromium: the system's where there is one, else the one that a registry package ships. */
export async function launchChromium(): Promise<Browser> {
  const system = SYSTEM.find((path) => existsSync(path));
  const executablePath = system ?? (await packaged.executablePath());
  const libraries = system === undefined ? packagedLibraries() : undefined;
  return chromium.launch({
    executablePath,
    args: ARGUMENTS,
    env: {
      ...(process.env as Record<string, string>),
      ...(libraries === undefined
        ? {}
        : { LD_LIBRARY_PATH: [libraries, process.env['LD_LIBRARY_PATH']].filter(Boolean).join(':') }),
    },
  });
}

/** The packaged browser needs libnss3 and libnspr4; where the system lacks them, the package brings copies of its own. */
function packagedLibraries(): string | undefined {
  if (hasSystemNss()) return undefined;
  const folder = join(tmpdir(), 'antinode-chromium-libraries');
  const lib = join(folder, 'lib');
  if (existsSync(join(lib, 'libnss3.so'))) return lib;
  const packageFolder = dirname(dirname(createRequire(import.meta.url).resolve('@sparticuz/chromium')));
  const archive = findArchive(packageFolder);
  mkdirSync(folder, { recursive: true });
  const tar = join(folder, 'libraries.tar');
  writeFileSync(tar, brotliDecompressSync(readFileSync(archive)));
  execFileSync('tar', ['-xf', tar, '-C', folder]);
  rmSync(tar);
  return lib;
}

function findArchive(folder: string): string {
  for (let at = folder; at !== dirname(at); at = dirname(at)) {
    const archive = join(at, 'bin', 'al2023.tar.br');
    if (existsSync(archive)) return archive;
  }
  throw new Error('the Chromium package brings no libraries');
}

function hasSystemNss(): boolean {
  try {
    return execFileSync('ldconfig', ['-p'], { encoding: 'utf8' }).includes('libnss3.so');
  } catch {
    return false;
  }
}
