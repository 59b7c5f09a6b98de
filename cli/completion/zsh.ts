import type { CommandWords } from './command-words.ts';

/** A completion script for zsh: the words of each command with their summaries. */
export function zshCompletion(commands: readonly CommandWords[]): string {
  const paths = commands.filter(({ path }) => path.length > 0).map(({ path }) => quoted(path.join(' ')));
  return `#compdef antinode
# Completion of antinode for zsh.
_antinode() {
  local path candidate i
  local -a offered
  path=""
  for ((i = 2; i < CURRENT; i++)); do
    candidate="\${path:+$path }\${words[i]}"
    case "$candidate" in
      ${paths.join('|')}) path="$candidate" ;;
    esac
  done
  case "$path" in
${commands.map(branch).join('\n')}
  esac
}
compdef _antinode antinode
`;
}

function branch({ path, commands, options, words, takesFiles }: CommandWords): string {
  const values = options
    .filter(({ takesValue }) => takesValue)
    .map(({ flags, choices }) => {
      const answer = choices.length > 0 ? `compadd -- ${choices.map(quoted).join(' ')}` : '_files';
      return `        ${flags.join('|')}) ${answer}; return ;;`;
    });
  const offered = [
    ...commands.map(({ name, summary }) => entry(name, summary)),
    ...words.map((word) => entry(word, '')),
    ...options.flatMap(({ flags, summary }) => flags.map((flag) => entry(flag, summary))),
  ];
  return `    ${quoted(path.join(' '))})
      case "\${words[CURRENT-1]}" in
${values.join('\n')}
        *) ;;
      esac
      offered=(${offered.join(' ')})
      _describe -t words 'word' offered${takesFiles ? '\n      _files' : ''}
      ;;`;
}

/** In a list of words, a colon parts a word from its summary. */
function entry(word: string, summary: string): string {
  const name = word.replaceAll(':', '\\:');
  return quoted(summary === '' ? name : `${name}:${summary}`);
}

function quoted(text: string): string {
  return `'${text.replaceAll("'", `'\\''`)}'`;
}
