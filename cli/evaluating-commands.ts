import { Option, type Command } from 'commander';
import type { EvaluateOptions } from './files/evaluate-file.ts';
import { collect, jsonFormat } from './options.ts';
import type { Execute } from './program.ts';

export interface RunOptions extends EvaluateOptions {
  readonly format: 'text' | 'json' | 'html' | 'csv';
  readonly out?: string;
  readonly strict?: true;
  readonly sensitivity?: true;
  readonly watch?: true;
}

export interface ExplainOptions extends EvaluateOptions {
  readonly format: 'text' | 'json';
}

export interface CompareOptions {
  readonly study?: string;
  readonly units?: 'us' | 'si';
  readonly format: 'text' | 'json';
}

/** The commands that evaluate sheets and show what came out. */
export function evaluatingCommands(program: Command, execute: Execute): void {
  evaluating(program.command('run').argument('<file>', 'sheet to evaluate; - reads standard input'))
    .description('evaluate a sheet')
    .addOption(
      new Option('--format <format>', 'form of the report').choices(['text', 'json', 'html', 'csv']).default('text'),
    )
    .option('--out <file>', 'write the report to a file')
    .option('--sensitivity', 'rank the uncertain inputs by their effect on each check')
    .option('--watch', 'evaluate again whenever a file of the sheet is saved')
    .option('--strict', 'warnings make the exit status 2')
    .addHelpText(
      'before',
      'Examples:\n  antinode run sheet.yaml\n  antinode run sheet.yaml --format html --out report.html\n  antinode run sheet.yaml --set p_d=915psig --units si\n  antinode run sheet.yaml --condition C07 --format csv\n  antinode run sheet.yaml --sensitivity\n  antinode run sheet.yaml --watch\n',
    )
    .action((file: string, options: RunOptions) =>
      execute(async (at) => (await import('./commands/run.ts')).run(file, options, at)),
    );

  evaluating(program.command('explain').argument('<file>', 'sheet; - reads standard input'))
    .argument('<name>', 'name of a quantity, or path or label of a check')
    .description('where one result comes from: formulas, numbers, and what they rest on')
    .addOption(jsonFormat())
    .addHelpText(
      'before',
      'Examples:\n  antinode explain sheet.yaml F\n  antinode explain sheet.yaml "Force on the run" --condition C07\n',
    )
    .action((file: string, name: string, options: ExplainOptions) =>
      execute(async (at) => (await import('./commands/explain.ts')).explain(file, name, options, at)),
    );

  program
    .command('compare')
    .argument('<before>', 'sheet, or revision on the team server: TH3-C-104@A')
    .argument('<after>', 'sheet or revision to hold against it')
    .description('what changed between two sheets: checks, inputs, formulas, results, text')
    .option('--study <study>', 'study of a revision; needed where you are in several')
    .addOption(unitsOption())
    .addOption(jsonFormat())
    .addHelpText(
      'before',
      'Examples:\n  antinode compare sheet-rev-a.yaml sheet-rev-b.yaml\n  antinode compare TH3-C-104@A sheet.yaml\n',
    )
    .addHelpText('after', '\nExit status: 0 both evaluate, whatever changed; 2 one of them is wrong.')
    .action((before: string, after: string, options: CompareOptions) =>
      execute(async (at) => (await import('./commands/compare.ts')).compare(before, after, options, at)),
    );
}

/** The options of a command that evaluates one sheet. */
function evaluating(command: Command): Command {
  return command
    .option('--set <name=value>', 'another value for an input; may be given again', collect, [])
    .option('--condition <id>', 'evaluate this operating condition alone')
    .addOption(unitsOption());
}

function unitsOption(): Option {
  return new Option('--units <system>', 'show all results in this system').choices(['us', 'si']);
}
