import type { CommandWords } from './command-words.ts';

/** A completion script for fish: one line for each word that may stand somewhere. */
export function fishCompletion(commands: readonly CommandWords[]): string {
  const lines = commands.flatMap(({ path, commands: children, options, words, takesFiles }) => {
    const here = condition(
      path,
      children.map(({ name }) => name),
    );
    return [
      ...children.map(({ name, summary }) => line(here, `-f -a ${quoted(name)}`, summary)),
      ...(words.length === 0 ? [] : [line(here, `-f -a ${quoted(words.join(' '))}`, '')]),
      ...(path.length > 0 && !takesFiles ? [line(here, '-f', '')] : []),
      ...options.map(({ flags, summary, takesValue, choices }) => {
        const names = flags.map((flag) => (flag.startsWith('--') ? `-l ${flag.slice(2)}` : `-s ${flag.slice(1)}`));
        const value = takesValue ? (choices.length > 0 ? `-x -a ${quoted(choices.join(' '))}` : '-r') : '';
        return line(here, [...names, value].join(' ').trim(), summary);
      }),
    ];
  });
  return `# Completion of antinode for fish.\n${lines.join('\n')}\n`;
}

function condition(path: readonly string[], children: readonly string[]): string {
  if (path.length === 0) return '__fish_use_subcommand';
  const seen = path.map((word) => `__fish_seen_subcommand_from ${word}`);
  const none = children.length > 0 ? [`not __fish_seen_subcommand_from ${children.join(' ')}`] : [];
  return [...seen, ...none].join('; and ');
}

function line(here: string, what: string, summary: string): string {
  return `complete -c antinode -n ${quoted(here)} ${what}${summary === '' ? '' : ` -d ${quoted(summary)}`}`;
}

function quoted(text: string): string {
  return `'${text.replaceAll('\\', '\\\\').replaceAll("'", "\\'")}'`;
}
