import { execFileSync } from 'node:child_process';
import { beforeAll, describe, expect, it } from 'vitest';
import { makeWorkplace, ROOT } from './harness.ts';

const place = makeWorkplace();

let file = '';

beforeAll(async () => {
  file = await place.write('antinode.bash', (await place.cli(['completion', 'bash'])).out);
});

/** What bash offers behind these words; the last one is being typed. */
function offered(...words: readonly string[]): string[] {
  const list = ['antinode', ...words].map((word) => `'${word}'`).join(' ');
  const program = `source '${file}'; COMP_WORDS=(${list}); COMP_CWORD=${words.length}; _antinode; printf '%s\\n' "\${COMPREPLY[@]}"`;
  return execFileSync('bash', ['--norc', '-c', program], { encoding: 'utf8', cwd: ROOT })
    .split('\n')
    .filter((line) => line !== '');
}

describe('completion in bash', () => {
  it.each([
    [['ex'], ['explain']],
    [
      ['new', ''],
      ['study', 'sheet', '--help', '-h'],
    ],
    [['run', '--form'], ['--format']],
    [
      ['run', '--format', ''],
      ['text', 'json', 'html', 'csv'],
    ],
    [['run', '--units', 's'], ['si']],
    [['lint', '--format', 'sa'], ['sarif']],
    [['completion', '--h'], ['--help']],
    [['functions', 'max_'], ['max_over']],
    [['run', 'package.j'], ['package.json']],
    [['run', '--out', 'package.j'], ['package.json']],
    [['units', 'ps'], []],
  ])('%j', (words, expected) => {
    expect(offered(...words)).toEqual(expected);
  });

  it('knows every command of the program', async () => {
    const { out } = await place.cli(['--help']);
    const commands = [...out.slice(out.indexOf('Commands:')).matchAll(/^ {2}([a-z]+)(?: |$)/gm)].map(
      (match) => match[1],
    );
    expect(commands.length).toBeGreaterThan(12);
    for (const command of commands.filter((name) => name !== 'help')) expect(offered('')).toContain(command);
  });
});

describe('completion in other shells', () => {
  it.each([
    ['zsh', "'explain:where one result comes from"],
    ['fish', "complete -c antinode -n '__fish_use_subcommand' -f -a 'explain'"],
  ])('%s', async (shell, line) => {
    expect((await place.cli(['completion', shell])).out).toContain(line);
  });

  it('is refused for a shell that has none', async () => {
    expect(await place.cli(['completion', 'tcsh'])).toMatchObject({ status: 3, out: '' });
  });
});
