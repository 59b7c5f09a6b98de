import type { Command, Option } from 'commander';

/** What may stand behind a command: read off the program itself, so that it can't fall behind. */
export interface CommandWords {
  /** Words of the command, without the program's own name: `new sheet`; empty for the program. */
  readonly path: readonly string[];
  readonly summary: string;
  readonly commands: readonly { readonly name: string; readonly summary: string }[];
  readonly options: readonly OptionWords[];
  /** Words that its first argument may be; files otherwise. */
  readonly words: readonly string[];
  readonly takesFiles: boolean;
}

export interface OptionWords {
  readonly flags: readonly string[];
  readonly summary: string;
  readonly takesValue: boolean;
  readonly choices: readonly string[];
}

/** All commands of a program, itself first. */
export function commandWords(program: Command, namesOf: Readonly<Record<string, readonly string[]>>): CommandWords[] {
  return collect(program, [], namesOf);
}

function collect(
  command: Command,
  path: readonly string[],
  namesOf: Readonly<Record<string, readonly string[]>>,
): CommandWords[] {
  const words = namesOf[path.join(' ')] ?? [];
  const own: CommandWords = {
    path,
    summary: command.description(),
    commands: command.commands.map((child) => ({ name: child.name(), summary: child.description() })),
    options: [...command.options, helpOf(command)].flatMap(optionWords),
    words,
    takesFiles: words.length === 0 && command.registeredArguments.some((argument) => FILES.has(argument.name())),
  };
  return [own, ...command.commands.flatMap((child) => collect(child, [...path, child.name()], namesOf))];
}

/** Names of arguments that stand for files or folders. */
const FILES = new Set(['file', 'dir', 'bundle', 'before', 'after']);

function helpOf(command: Command): Option | undefined {
  return command
    .createHelp()
    .visibleOptions(command)
    .find((option) => option.long === '--help');
}

function optionWords(option: Option | undefined): OptionWords[] {
  if (option === undefined) return [];
  const flags = [option.long, option.short].filter((flag): flag is string => typeof flag === 'string');
  return [
    {
      flags,
      summary: option.description,
      takesValue: option.required || option.optional,
      choices: option.argChoices ?? [],
    },
  ];
}
