import { existsSync } from 'node:fs';
import { CommandFailure, EXIT, type ExitStatus } from '../exit-status.ts';
import type { Invocation } from '../program.ts';

interface ServeOptions {
  readonly data?: string;
  readonly port?: string;
  readonly host?: string;
  readonly demo?: true;
}

interface DemoPerson {
  readonly name: string;
  readonly email: string;
  readonly role: string;
  readonly password: string;
}

interface Running {
  readonly url: string;
  readonly serverKey: string;
  readonly demo: readonly DemoPerson[];
  readonly stop: () => Promise<void>;
}

/** The server is a program of its own, a second bundle: the command line knows no more of it than this. */
interface ServerModule {
  readonly serve: (
    env: Invocation['env'],
    options: ServeOptions,
  ) => Promise<Running | { readonly faults: readonly string[] }>;
}

/** Beside the command line's bundle, or its sources when the command line runs from its own. */
const SERVERS = ['../server/main.js', '../../server/main.ts'];

/** Runs the team server until it is interrupted. */
export async function serve(options: ServeOptions, at: Invocation): Promise<ExitStatus> {
  const server = await loadServer();
  const running = await start(server, options, at);
  at.streams.out(`Antinode listens on ${at.paintOut('bold', running.url)}\n`);
  at.streams.out(`Its bundles are sealed by the key ${running.serverKey} (antinode verify --key …)\n`);
  if (running.demo.length > 0) at.streams.out(demoText(running.demo));
  at.streams.err('Ctrl-C stops it.\n');
  await interrupted();
  await running.stop();
  return EXIT.done;
}

async function loadServer(): Promise<ServerModule> {
  const url = SERVERS.map((path) => new URL(path, import.meta.url)).find((candidate) => existsSync(candidate));
  if (url === undefined) throw new CommandFailure(EXIT.bug, 'the server is not built', ['run `npm run build`']);
  return (await import(url.href)) as ServerModule;
}

async function start({ serve: run }: ServerModule, options: ServeOptions, at: Invocation): Promise<Running> {
  const running = await run(at.env, options).catch((cause: unknown) => {
    throw new CommandFailure(
      EXIT.server,
      `the server can't start: ${cause instanceof Error ? cause.message : String(cause)}`,
    );
  });
  if ('faults' in running) throw new CommandFailure(EXIT.usage, running.faults.join('\n  '));
  return running;
}

function demoText(people: readonly DemoPerson[]): string {
  const width = Math.max(...people.map(({ email }) => email.length));
  const rows = people.map(({ email, role, name }) => `  ${email.padEnd(width)}  ${role.padEnd(8)}  ${name}`);
  return `\nSign-ins of the demo study, all with the password ${people[0]?.password ?? ''}:\n${rows.join('\n')}\n\n`;
}

/** Takes the place of the command line's own way of ending at Ctrl-C: what is under way is finished first. */
function interrupted(): Promise<void> {
  return new Promise((resolve) => {
    for (const signal of ['SIGINT', 'SIGTERM'] as const) {
      process.removeAllListeners(signal);
      process.once(signal, () => resolve());
    }
  });
}
