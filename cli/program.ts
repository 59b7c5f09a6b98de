import { Argument, Command, CommanderError, Option } from 'commander';
import { CORE_VERSION } from '../core/version.ts';
import { evaluatingCommands } from './evaluating-commands.ts';
import { SHELLS, type Shell } from './completion/shells.ts';
import type { LintOptions } from './commands/lint.ts';
import type { PullOptions } from './commands/pull.ts';
import { CommandFailure, EXIT, type ExitStatus } from './exit-status.ts';
import { harmlessText } from './output/harmless.ts';
import { jsonFormat } from './options.ts';
import { paintFor, type Paint, type Surroundings } from './terminal.ts';

/** What every command is given besides its own arguments. */
export interface Invocation extends Surroundings {
  readonly paintOut: Paint;
  readonly paintErr: Paint;
}

type Run = (invocation: Invocation) => Promise<ExitStatus>;

/**
 * Runs one command line and gives its exit status. Commands are loaded only when they are called, so that the program
 * starts at once.
 */
export async function runCli(args: readonly string[], surroundings: Surroundings): Promise<ExitStatus> {
  let status: ExitStatus = EXIT.done;
  const invocation = (): Invocation => {
    const colour = !args.includes('--no-color');
    const { streams, env } = surroundings;
    return {
      ...surroundings,
      paintOut: paintFor(streams.outIsTerminal, env, colour),
      paintErr: paintFor(streams.errIsTerminal, env, colour),
    };
  };
  const program = buildProgram(surroundings, async (run) => {
    status = await run(invocation());
  });
  try {
    await program.parseAsync(args, { from: 'user' });
    return status;
  } catch (cause) {
    return explainFailure(cause, invocation());
  }
}

function explainFailure(cause: unknown, { streams, paintErr, env }: Invocation): ExitStatus {
  if (cause instanceof CommanderError) return cause.exitCode === 0 ? EXIT.done : EXIT.usage;
  if (cause instanceof CommandFailure) {
    streams.err(`${paintErr(['red', 'bold'], 'error')}: ${harmlessText(cause.message)}\n`);
    for (const hint of cause.hints) streams.err(`  = hint: ${harmlessText(hint)}\n`);
    return cause.status;
  }
  streams.err(
    `${paintErr(['red', 'bold'], 'error')}: this is a fault of Antinode, not of your sheet; please report it\n`,
  );
  const detail = cause instanceof Error ? cause : new Error(String(cause));
  streams.err(`  ${env['ANTINODE_DEBUG'] === undefined ? detail.message : (detail.stack ?? detail.message)}\n`);
  return EXIT.bug;
}

export type Execute = (run: Run) => Promise<void>;

function buildProgram({ streams }: Surroundings, execute: Execute): Command {
  const program = new Command('antinode')
    .description('Calculation notebook for reciprocating-compressor packages.')
    .version(CORE_VERSION)
    .option('--no-color', 'write without colour')
    .showSuggestionAfterError()
    .exitOverride()
    .configureOutput({ writeOut: streams.out, writeErr: streams.err })
    .addHelpText('before', EXAMPLES)
    .addHelpText('after', STATUSES);
  sheetCommands(program, execute);
  catalogueCommands(program, execute);
  serverCommands(program, execute);
  for (const command of program.commands) inherit(command, program);
  return program;
}

/** Commander hands its settings to subcommands only where they are made by `command()` after the settings. */
function inherit(command: Command, parent: Command): void {
  command.copyInheritedSettings(parent);
  for (const child of command.commands) inherit(child, command);
}

const EXAMPLES = `Examples:
  antinode new study compressor-study       a study folder with a sheet that runs
  antinode run sheet.yaml                   evaluate a sheet and print its report
  antinode run sheet.yaml --set p_d=915psig --units si
  antinode explain sheet.yaml F             where one result comes from
  antinode compare rev-a.yaml rev-b.yaml    what changed
  antinode functions speed_of_sound         what a function takes, gives, and rests on
`;

const STATUSES = `
Exit status: 0 done and every check passes, 1 some check fails, 2 the sheet is wrong, 3 wrong usage,
4 the server refused or is out of reach.`;

function sheetCommands(program: Command, execute: Execute): void {
  const create = program
    .command('new')
    .description('write a commented starting point that runs')
    .addHelpText(
      'before',
      'Examples:\n  antinode new study compressor-study\n  antinode new sheet lateral-force.yaml\n',
    );
  create
    .command('study')
    .argument('<dir>', 'folder to make')
    .description('a study folder with a first sheet')
    .addHelpText('before', 'Example:\n  antinode new study compressor-study\n')
    .action((dir: string) => execute(async (at) => (await import('./commands/new.ts')).newStudy(dir, at)));
  create
    .command('sheet')
    .argument('<file>', 'file to write')
    .description('a sheet')
    .addHelpText('before', 'Example:\n  antinode new sheet lateral-force.yaml\n')
    .action((file: string) => execute(async (at) => (await import('./commands/new.ts')).newSheet(file, at)));

  program
    .command('lint')
    .argument('<file...>', 'sheets to check; - reads standard input')
    .description('diagnostics only')
    .addOption(
      new Option('--format <format>', 'form of the answer').choices(['text', 'short', 'json', 'sarif']).default('text'),
    )
    .option('--strict', 'warnings make the exit status 2')
    .addHelpText(
      'before',
      'Examples:\n  antinode lint sheet.yaml\n  antinode lint *.yaml --format sarif > antinode.sarif\n',
    )
    .action((files: string[], options: LintOptions) =>
      execute(async (at) => (await import('./commands/lint.ts')).lint(files, options, at)),
    );

  evaluatingCommands(program, execute);

  program
    .command('verify')
    .argument('<bundle>', 'bundle file of an approved revision')
    .option('--key <id>', 'id of the server key that you trust')
    .description('check signatures, digests and log proof, and evaluate again, offline')
    .addOption(jsonFormat())
    .addHelpText('before', 'Example:\n  antinode verify TH3-C-104-B.bundle.json\n')
    .addHelpText('after', '\nExit status: 0 the bundle holds, 1 it is refused, 2 it is no bundle.')
    .action((bundle: string, options: { key?: string; format: 'text' | 'json' }) =>
      execute(async (at) => (await import('./commands/verify.ts')).verify(bundle, options, at)),
    );
}

function catalogueCommands(program: Command, execute: Execute): void {
  program
    .command('functions')
    .argument('[name]', 'one function')
    .description('the functions that sheets may call')
    .addOption(jsonFormat())
    .addHelpText('before', 'Examples:\n  antinode functions\n  antinode functions pipe_bore\n')
    .action((name: string | undefined, options: { format: 'text' | 'json' }) =>
      execute(async (at) => (await import('./commands/functions.ts')).functions(name, options, at)),
    );
  program
    .command('units')
    .argument('[text...]', 'a unit or a value')
    .description('the units that sheets may use, or what a value is in other units')
    .addOption(jsonFormat())
    .addHelpText('before', 'Examples:\n  antinode units\n  antinode units 905 psia\n')
    .action((text: string[], options: { format: 'text' | 'json' }) =>
      execute(async (at) => (await import('./commands/units.ts')).units(text.join(' '), options, at)),
    );
  program
    .command('completion')
    .addArgument(new Argument('<shell>', 'shell to complete in').choices(SHELLS))
    .description('a completion script, for the shell to read')
    .addHelpText(
      'before',
      'Examples:\n  antinode completion bash > ~/.local/share/bash-completion/completions/antinode\n  antinode completion fish > ~/.config/fish/completions/antinode.fish\n  antinode completion zsh > ~/.zsh/functions/_antinode\n',
    )
    .action((shell: Shell) =>
      execute(async (at) => (await import('./commands/completion.ts')).completion(shell, program, at)),
    );
}

function serverCommands(program: Command, execute: Execute): void {
  program
    .command('login')
    .argument('[server]', 'address of the team server')
    .description('sign in; you approve it in the browser')
    .addHelpText('before', 'Example:\n  antinode login http://127.0.0.1:5181\n')
    .action((server: string | undefined) =>
      execute(async (at) => (await import('./commands/login.ts')).login(server, at)),
    );
  program
    .command('logout')
    .description('forget the sign-in')
    .addHelpText('before', 'Example:\n  antinode logout\n')
    .action(() => execute(async (at) => (await import('./commands/logout.ts')).logout(at)));
  program
    .command('whoami')
    .description('who is signed in, and where')
    .addOption(jsonFormat())
    .addHelpText('before', 'Examples:\n  antinode whoami\n  antinode whoami --format json\n')
    .action((options: { format: 'text' | 'json' }) =>
      execute(async (at) => (await import('./commands/whoami.ts')).whoami(options, at)),
    );
  program
    .command('push')
    .argument('<file>', 'sheet to push')
    .option('--study <study>', 'study to push to; needed where you are an engineer of several')
    .description('evaluate a sheet and push it to the team server as a new revision')
    .addOption(jsonFormat())
    .addHelpText('before', 'Example:\n  antinode push sheet.yaml --study th-3\n')
    .action((file: string, options: { study?: string; format: 'text' | 'json' }) =>
      execute(async (at) => (await import('./commands/push.ts')).push(file, options, at)),
    );
  program
    .command('pull')
    .argument('[revision]', 'document number and revision, such as TH3-C-102@B')
    .option('--all <sheet>', 'fetch every revision that a sheet takes values from')
    .option('--study <study>', 'study that the revision is of; needed where you are in several')
    .option('--lock <dir>', 'folder of the lock file', '.')
    .option('--files <dir>', 'write its files and its report there as well')
    .description('fetch the values of a revision, for a sheet to take, into the lock file beside it')
    .addOption(jsonFormat())
    .addHelpText(
      'before',
      'Examples:\n  antinode pull TH3-C-102@B\n  antinode pull TH3-C-102@B --files th3-c-102-b\n  antinode pull --all sheet.yaml\n',
    )
    .action((revision: string | undefined, options: PullOptions) =>
      execute(async (at) => (await import('./commands/pull.ts')).pull(revision, options, at)),
    );
  program
    .command('status')
    .argument('[study]', 'one study')
    .description('revisions on the team server, and what they wait for')
    .addOption(jsonFormat())
    .addHelpText('before', 'Example:\n  antinode status th-3\n')
    .action((study: string | undefined, options: { format: 'text' | 'json' }) =>
      execute(async (at) => (await import('./commands/status.ts')).status(study, options, at)),
    );
  program
    .command('serve')
    .option('--data <dir>', 'folder of the data')
    .option('--port <port>', 'port to listen on')
    .option('--host <host>', 'address to listen on')
    .option('--demo', 'seed the demo study, and show its sign-ins')
    .description('run the team server')
    .addHelpText('before', 'Examples:\n  antinode serve --demo\n  antinode serve --data /srv/antinode --port 8080\n')
    .action((options: { data?: string; port?: string; host?: string; demo?: true }) =>
      execute(async (at) => (await import('./commands/serve.ts')).serve(options, at)),
    );
}
