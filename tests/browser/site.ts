import { readFileSync } from 'node:fs';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Browser, BrowserContextOptions, Page } from 'playwright-core';
import { startServer, type RunningServer } from '../../server/start.ts';
import { runCli } from '../../cli/program.ts';
import type { ExitStatus } from '../../cli/exit-status.ts';
import { launchChromium } from './chromium.ts';

export const PEOPLE = {
  author: 'maren.aldous@tarnhollow.example',
  checker: 'idris.kestrel@tarnhollow.example',
  approver: 'solveig.brandt@tarnhollow.example',
  reader: 'tomas.reyes@tarnhollow.example',
} as const;

export const PASSWORD = 'antinode-demo';
export const EXAMPLE = readFileSync(
  join(import.meta.dirname, '../../examples/tarn-hollow/discharge-run-force.yaml'),
  'utf8',
);

/** A team server with the demo study, a browser, and a folder for files. */
export interface Site {
  readonly server: RunningServer;
  readonly browser: Browser;
  readonly folder: string;
  readonly close: () => Promise<void>;
}

export async function openSite(): Promise<Site> {
  const server = await startServer({ data: ':memory:', host: '127.0.0.1', port: 0, logLevel: 'silent', isDemo: true });
  const browser = await launchChromium();
  const folder = await mkdtemp(join(tmpdir(), 'antinode-browser-'));
  const close = async (): Promise<void> => {
    await browser.close();
    await server.stop();
    await rm(folder, { recursive: true });
  };
  return { server, browser, folder, close };
}

/** A page whose every complaint in the console is kept: a page that works has none. */
export interface WatchedPage {
  readonly page: Page;
  readonly complaints: string[];
  readonly close: () => Promise<void>;
}

export async function openPage({ browser, server }: Site, options: BrowserContextOptions = {}): Promise<WatchedPage> {
  const context = await browser.newContext({ baseURL: server.url, viewport: { width: 1440, height: 900 }, ...options });
  const page = await context.newPage();
  const complaints: string[] = [];
  page.on('console', (message) => {
    if (message.type() === 'error' || message.type() === 'warning') complaints.push(message.text());
  });
  page.on('pageerror', (error) => complaints.push(error.message));
  page.on('request', (request) => {
    if (!request.url().startsWith(server.url) && !/^(data|blob):/.test(request.url()))
      complaints.push(`left the site: ${request.url()}`);
  });
  return { page, complaints, close: () => context.close() };
}

export async function signIn(page: Page, email: string): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password').fill(PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
}

export interface CommandRun {
  readonly status: ExitStatus;
  readonly out: string;
  readonly err: string;
}

/** A command line in the site's folder, signed in by a token where one is given. */
export async function command({ server, folder }: Site, args: readonly string[], token?: string): Promise<CommandRun> {
  const written = { out: '', err: '' };
  const status = await runCli(args, {
    streams: {
      out: (text) => (written.out += text),
      err: (text) => (written.err += text),
      outIsTerminal: false,
      errIsTerminal: false,
      readStdin: () => Promise.resolve(new Uint8Array()),
    },
    env: { HOME: folder, ANTINODE_SERVER: server.url, ...(token === undefined ? {} : { ANTINODE_TOKEN: token }) },
    cwd: folder,
  });
  return { status, ...written };
}
