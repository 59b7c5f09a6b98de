import type { CommandWords } from './command-words.ts';

/** A completion script for bash: one branch for each command, with nothing to compute when a key is pressed. */
export function bashCompletion(commands: readonly CommandWords[]): string {
  const branches = commands.map(branch).join('\n');
  const paths = commands.filter(({ path }) => path.length > 0).map(({ path }) => quoted(path.join(' ')));
  return `# Completion of antinode for bash.
_antinode() {
  local word previous path candidate i
  word="\${COMP_WORDS[COMP_CWORD]}"
  previous="\${COMP_WORDS[COMP_CWORD-1]}"
  path=""
  for ((i = 1; i < COMP_CWORD; i++)); do
    candidate="\${path:+$path }\${COMP_WORDS[i]}"
    case "$candidate" in
      ${paths.join('|')}) path="$candidate" ;;
    esac
  done
  COMPREPLY=()
  case "$path" in
${branches}
  esac
}
complete -o filenames -F _antinode antinode
`;
}

function branch({ path, commands, options, words, takesFiles }: CommandWords): string {
  const values = options.filter(({ takesValue }) => takesValue);
  const cases = values.map(({ flags, choices }) => {
    const answer = choices.length > 0 ? compgen(choices) : 'COMPREPLY=($(compgen -f -- "$word"))';
    return `        ${flags.join('|')}) ${answer}; return ;;`;
  });
  const offered = [...commands.map(({ name }) => name), ...words, ...options.flatMap(({ flags }) => flags)];
  const files = takesFiles ? '\n      [[ "$word" != -* ]] && COMPREPLY+=($(compgen -f -- "$word"))' : '';
  return `    ${quoted(path.join(' '))})
      case "$previous" in
${cases.join('\n')}
        *) ;;
      esac
      ${compgen(offered)}${files}
      ;;`;
}

function compgen(words: readonly string[]): string {
  return `COMPREPLY=($(compgen -W ${quoted(words.join(' '))} -- "$word"))`;
}

function quoted(text: string): string {
  return `'${text.replaceAll("'", `'\\''`)}'`;
}
