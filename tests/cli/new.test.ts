import { join } from 'node:path';
import { mkdir } from 'node:fs/promises';
import { describe, expect, it } from 'vitest';
import type { LocatedDiagnostic } from '../../core/report/model.ts';
import { CORE_VERSION } from '../../core/version.ts';
import { makeWorkplace } from './harness.ts';

const { cli, write, read, folder } = makeWorkplace();

async function diagnosticsOf(sheet: string): Promise<readonly LocatedDiagnostic[]> {
  const { out } = await cli(['lint', sheet, '--format', 'json']);
  return (JSON.parse(out) as { diagnostics: readonly LocatedDiagnostic[] }).diagnostics;
}

describe('new study', () => {
  it('makes a folder with sheets that run without a complaint', async () => {
    const made = await cli(['new', 'study', 'compressor-study']);
    const files = ['shaking-force.yaml', 'operating-range.yaml', 'basis.yaml', 'conditions.csv'];
    const paths = files.map((file) => join('compressor-study', file));
    const [sheet = '', range = ''] = paths;
    expect(made).toEqual({
      status: 0,
      out: paths.map((path) => `${path}\n`).join(''),
      err: `Next: antinode run ${sheet}, then antinode run ${range}\n`,
    });
    for (const path of [sheet, range]) {
      expect(await diagnosticsOf(path)).toEqual([]);
      const ran = await cli(['run', path]);
      expect(ran).toMatchObject({ status: 0, err: '' });
      expect(ran.out).toContain('2 checks pass');
    }
  });

  it('takes an empty folder that is there', async () => {
    await mkdir(join(folder, 'empty'));
    expect((await cli(['new', 'study', 'empty'])).status).toBe(0);
  });

  it('leaves a folder alone in which there is something', async () => {
    await write('full/notes.txt', 'mine');
    const { status, out, err } = await cli(['new', 'study', 'full']);
    expect({ status, out }).toEqual({ status: 3, out: '' });
    expect(err).toBe('error: the folder `full` is not empty\n  = hint: name a new folder\n');
  });

  it('says that a file is no folder', async () => {
    await write('file', 'mine');
    const { status, err } = await cli(['new', 'study', 'file']);
    expect(status).toBe(3);
    expect(err).toContain('`file` cannot be made: it is a file');
    expect(await read('file')).toBe('mine');
  });
});

describe('new sheet', () => {
  it('writes a sheet that runs, with a line of help on the parts of a sheet', async () => {
    const made = await cli(['new', 'sheet', 'laterals/force.yaml']);
    expect(made).toMatchObject({ status: 0, out: `${join('laterals', 'force.yaml')}\n` });
    expect(await diagnosticsOf('laterals/force.yaml')).toEqual([]);
    expect((await cli(['run', 'laterals/force.yaml'])).status).toBe(0);
    const comments = (await read('laterals/force.yaml')).split('\n').filter((line) => line.includes('#'));
    expect(comments.length).toBeGreaterThan(5);
  });

  it('never writes over a file', async () => {
    await write('mine.yaml', 'mine');
    const { status, out, err } = await cli(['new', 'sheet', 'mine.yaml']);
    expect({ status, out, err }).toEqual({ status: 3, out: '', err: 'error: `mine.yaml` exists already\n' });
    expect(await read('mine.yaml')).toBe('mine');
  });

  it('says why a folder on the way cannot be made', async () => {
    await write('blocked', 'mine');
    const { status, err } = await cli(['new', 'sheet', 'blocked/force.yaml']);
    expect(status).toBe(3);
    expect(err).toMatch(/^error: `blocked\/force\.yaml` cannot be written: /);
  });
});

describe('usage', () => {
  it.each([
    { slip: 'unknown command', args: ['rnu', 'sheet.yaml'], message: /unknown command 'rnu'\n\(Did you mean run\?\)/ },
    { slip: 'unknown kind of new', args: ['new', 'shete', 'a.yaml'], message: /\(Did you mean sheet\?\)/ },
    { slip: 'missing argument', args: ['new', 'sheet'], message: /missing required argument 'file'/ },
    { slip: 'missing bundle', args: ['verify'], message: /missing required argument 'bundle'/ },
    { slip: 'unknown option', args: ['lint', 'a.yaml', '--strct'], message: /\(Did you mean --strict\?\)/ },
    { slip: 'option without its value', args: ['run', 'a.yaml', '--out'], message: /argument missing/ },
    { slip: 'too many arguments', args: ['verify', 'a', 'b'], message: /too many arguments/ },
  ])('is status 3 for $slip', async ({ args, message }) => {
    const { status, out, err } = await cli(args);
    expect({ status, out }).toEqual({ status: 3, out: '' });
    expect(err).toMatch(message);
  });

  it('shows the help to who gives no command', async () => {
    const { status, out, err } = await cli([]);
    expect({ status, out }).toEqual({ status: 3, out: '' });
    expect(err).toMatch(/^Examples:\n {2}antinode new study/);
  });
});

describe('help', () => {
  const COMMANDS = [
    ['new'],
    ['new', 'study'],
    ['new', 'sheet'],
    ['lint'],
    ['run'],
    ['explain'],
    ['compare'],
    ['verify'],
    ['functions'],
    ['units'],
    ['completion'],
    ['login'],
    ['logout'],
    ['whoami'],
    ['push'],
    ['pull'],
    ['status'],
    ['serve'],
  ].map((words) => words.join(' '));

  it('lists every command, after examples', async () => {
    const { status, out, err } = await cli(['--help']);
    expect({ status, err }).toEqual({ status: 0, err: '' });
    expect(out).toMatch(/^Examples:\n {2}antinode /);
    const listed = [...out.matchAll(/^ {2}([a-z]+) /gm)].map(([, name]) => name).filter((name) => name !== 'antinode');
    expect(listed).toEqual([...new Set(COMMANDS.map((command) => command.split(' ')[0])), 'help']);
    expect(out).toContain('4 the server refused or is out of reach');
  });

  it.each(COMMANDS)('of %s begins with an example that calls it', async (command) => {
    const { status, out, err } = await cli([...command.split(' '), '--help']);
    expect({ status, err }).toEqual({ status: 0, err: '' });
    expect(out).toMatch(new RegExp(`^Examples?:\n {2}antinode ${command}(?: |\n)`));
    expect(out).toContain(`Usage: antinode ${command}`);
  });

  it('is had by `help run` as well', async () => {
    expect((await cli(['help', 'run'])).out).toBe((await cli(['run', '--help'])).out);
  });
});

describe('--version', () => {
  it.each(['--version', '-V'])('%s is the version of the core', async (option) => {
    expect(await cli([option])).toEqual({ status: 0, out: `${CORE_VERSION}\n`, err: '' });
  });
});
