import type { Command } from 'commander';
import { BUILT_IN_NAMES } from '../../core/expression/built-in.ts';
import { LIBRARY } from '../../core/library/catalogue.ts';
import { bashCompletion } from '../completion/bash.ts';
import { commandWords } from '../completion/command-words.ts';
import { fishCompletion } from '../completion/fish.ts';
import { zshCompletion } from '../completion/zsh.ts';
import type { Shell } from '../completion/shells.ts';
import { EXIT, type ExitStatus } from '../exit-status.ts';
import type { Invocation } from '../program.ts';

const SCRIPTS = { bash: bashCompletion, zsh: zshCompletion, fish: fishCompletion };

/** Writes a completion script, made from the program's own commands, options and choices. */
export function completion(shell: Shell, program: Command, { streams }: Invocation): Promise<ExitStatus> {
  const words = commandWords(program, { functions: [...LIBRARY.keys(), ...BUILT_IN_NAMES] });
  streams.out(SCRIPTS[shell](words));
  return Promise.resolve(EXIT.done);
}
