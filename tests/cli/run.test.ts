import { describe, expect, it } from 'vitest';
import type { Report } from '../../core/report/model.ts';
import { CORE_VERSION } from '../../core/version.ts';
import { ensureBuilt, EXAMPLE, makeWorkplace, type CommandOptions, type Ended } from './harness.ts';
import { sheetText } from './sheets.ts';

const { cli, write, read } = makeWorkplace();

const ESCAPE = /\u001B/;
const IN = 0.0254;
const PSI = 6894.757293168;
const LBF = 4.4482216152605;
/** Area of a 6 inch circle times 60 psi. */
const FORCE_LBF = (Math.PI / 4) * 6 ** 2 * 60;

async function run(sheet: string, args: readonly string[] = [], options: CommandOptions = {}): Promise<Ended> {
  await write('sheet.yaml', sheet);
  return cli(['run', 'sheet.yaml', ...args], options);
}

async function reportOf(sheet: string, args: readonly string[] = []): Promise<Report> {
  const { out } = await run(sheet, [...args, '--format', 'json']);
  return JSON.parse(out) as Report;
}

/** A sheet that gives a warning: an ideal gas at a pressure at which gases are none. */
const WARNED = sheetText({
  top: ['gases: { gas: { method: ideal, fractions: { methane: 100 % }, source: basis } }'],
  inputs: ['T: { value: 120 degF, source: basis }'],
  steps: ['c: { calc: "speed_of_sound(gas, p, T)", label: Speed of sound }'],
});

describe('exit status', () => {
  it('is 0 when every check passes', async () => {
    expect(await run(sheetText())).toMatchObject({ status: 0, err: '' });
  });

  it('is 1 when a check fails, and the report is written all the same', async () => {
    const ended = await run(sheetText(), ['--set', 'F_lim=1000 lbf']);
    expect(ended.status).toBe(1);
    expect(ended.out).toMatch(/F <= F_lim\s+1\.70\s+▲ over/);
    expect(ended.out).toContain('1 check of 1 over');
  });

  it('is 2 when the sheet is wrong', async () => {
    expect(await run(sheetText({ steps: ['x: 2*nothing'] }))).toMatchObject({ status: 2, out: '' });
  });

  it.each([
    { usage: 'no file', args: ['run'], message: /missing required argument 'file'/ },
    { usage: 'unknown option', args: ['run', 'sheet.yaml', '--fromat', 'json'], message: /did you mean --format/i },
    { usage: 'unknown format', args: ['run', 'sheet.yaml', '--format', 'docx'], message: /text, json, html/ },
    { usage: 'unknown system of units', args: ['run', 'sheet.yaml', '--units', 'cgs'], message: /us, si/ },
    { usage: 'more than one file', args: ['run', 'sheet.yaml', 'other.yaml'], message: /too many arguments/ },
  ])('is 3 for wrong usage: $usage', async ({ args, message }) => {
    await write('sheet.yaml', sheetText());
    const ended = await cli(args);
    expect(ended).toMatchObject({ status: 3, out: '' });
    expect(ended.err).toMatch(message);
  });

  it('is 0 with warnings, and 2 where --strict makes them count', async () => {
    expect((await run(WARNED)).status).toBe(0);
    const strict = await run(WARNED, ['--strict']);
    expect(strict.status).toBe(2);
    expect(strict.out).toContain('Force on the bore');
  });

  it('says that the sheet is wrong before it says that a check fails', async () => {
    expect((await run(WARNED, ['--strict', '--set', 'F_lim=1000 lbf'])).status).toBe(2);
  });
});

describe('run --format json', () => {
  it('holds what other programs rely on', async () => {
    const sheet = sheetText({ inputs: ['x: { value: 3 %, label: Ripple, hold: Awaiting the vendor }'] });
    const report = await reportOf(sheet);
    expect(report).toMatchObject({
      antinode: 'report/1',
      core: CORE_VERSION,
      sheet: { number: 'T-001', title: 'Force on a bore' },
      holds: [{ path: 'inputs/x', name: 'x', label: 'Ripple', reason: 'Awaiting the vendor' }],
      diagnostics: [],
    });
    expect(report.sheet.digest).toMatch(/^sha256-[0-9a-f]{64}$/);
    expect(Object.keys(report.quantities).sort()).toEqual(['A', 'D', 'F', 'F_lim', 'dp', 'p', 'x']);
    for (const quantity of Object.values(report.quantities)) {
      expect(quantity).toMatchObject({ axes: [], label: expect.any(String) as string });
      expect(quantity.digest).toMatch(/^sha256-[0-9a-f]{64}$/);
    }
  });

  it('gives each quantity in its unit and in SI', async () => {
    const { quantities } = await reportOf(sheetText());
    const { F, dp, p } = quantities;
    expect(F).toMatchObject({ unit: 'lbf', dimension: 'force', label: 'Force on the bore' });
    expect(F?.value).toBeCloseTo(FORCE_LBF, 9);
    expect(F?.si).toBeCloseTo(FORCE_LBF * LBF, 8);
    expect(dp?.value).toBeCloseTo(60, 9);
    expect(dp).toMatchObject({ unit: 'psi', dimension: 'pressure difference' });
    expect(dp?.si).toBeCloseTo(60 * PSI, 6);
    expect(p).toMatchObject({ unit: 'psig', dimension: 'pressure level' });
    expect(p?.value).toBeCloseTo(900, 9);
    // A gauge reading stands in SI as an absolute pressure, with the sheet's own atmosphere.
    expect(p?.si).toBeCloseTo((900 + 14.7) * PSI, 6);
    expect(quantities['A']?.si).toBeCloseTo((Math.PI / 4) * (6 * IN) ** 2, 12);
  });

  it('gives each check with its utilisation', async () => {
    const { checks, summary } = await reportOf(sheetText());
    expect(checks).toEqual([
      {
        path: 'sections/1/checks/1',
        that: 'F <= F_lim',
        label: 'Force below its limit',
        status: 'pass',
        utilisation: expect.closeTo(FORCE_LBF / 2000, 12) as number,
        governing: {},
      },
    ]);
    expect(summary).toMatchObject({ passed: 1, failed: 0, holds: 0 });
    const failing = await reportOf(sheetText(), ['--set', 'F_lim=1000 lbf']);
    expect(failing.checks).toMatchObject([{ status: 'fail' }]);
  });

  it('carries the warnings with their places, which stay on stderr for people', async () => {
    const { out, err, status } = await run(WARNED, ['--format', 'json']);
    expect(status).toBe(0);
    expect((JSON.parse(out) as Report).diagnostics).toMatchObject([
      { code: 'VALIDITY', severity: 'warning', file: 'sheet.yaml', line: 20, column: 39 },
    ]);
    expect(err).toContain('warning[VALIDITY]');
  });

  it('is the same, byte for byte, when it is run again', async () => {
    const first = await cli(['run', EXAMPLE, '--format', 'json']);
    const second = await cli(['run', EXAMPLE, '--format', 'json']);
    expect(second.out).toBe(first.out);
    expect(first.status).toBe(0);
  });
});

describe('run --format text', () => {
  it('shows inputs with their sources, steps with formula and result, and checks', async () => {
    const { out } = await run(sheetText());
    expect(out).toMatch(/^Force on a bore\nT-001 · ─/);
    expect(out).toMatch(/Line pressure\s+p\s+900 psig\s+Design basis/);
    expect(out).toMatch(/Force on the bore\s+F = dp\*A = 1696 lbf/);
    expect(out).toMatch(/Force below its limit\s+F <= F_lim\s+0\.85\s+● within/);
    expect(out).toContain('1 check pass');
    expect(out).toContain('support, and do not replace, the judgement of a licensed engineer');
  });

  it('shows open holds before all else', async () => {
    const { out } = await run(sheetText({ inputs: ['x: { value: 3 %, label: Ripple, hold: Awaiting the vendor }'] }));
    expect(out.indexOf('Ripple: Awaiting the vendor')).toBeLessThan(out.indexOf('Basis and inputs'));
    expect(out).toContain('1 hold open');
  });

  it('keeps warnings out of the answer', async () => {
    const { out, err } = await run(WARNED);
    expect(out).not.toContain('VALIDITY');
    expect(err).toMatch(/^warning\[VALIDITY\]: .*\n +--> sheet\.yaml:20:39\n/);
    expect(err).toMatch(/\n1 warning\n$/);
  });
});

describe('run --set', () => {
  it.each(['dp=30psi', 'dp=30 psi', 'dp = 30 psi', 'dp=30 lbf/in^2'])('reads `%s`', async (set) => {
    const { quantities } = await reportOf(sheetText(), ['--set', set]);
    expect(quantities['F']?.value).toBeCloseTo(FORCE_LBF / 2, 9);
  });

  it('may be given more than once, and other units are converted', async () => {
    const { quantities } = await reportOf(sheetText(), ['--set', 'dp=1 bar', '--set', 'D=100 mm']);
    expect(quantities['F']?.si).toBeCloseTo(1e5 * (Math.PI / 4) * 0.1 ** 2, 9);
  });

  it('changes the digest of the input and of what reads it, and of nothing else', async () => {
    const before = (await reportOf(sheetText())).quantities;
    const after = (await reportOf(sheetText(), ['--set', 'dp=30 psi'])).quantities;
    const changed = Object.keys(before).filter((name) => before[name]?.digest !== after[name]?.digest);
    expect(changed).toEqual(['dp', 'F']);
  });

  it.each([
    { slip: 'name of no input', set: 'F_lin=3 lbf', code: 'OVERRIDE', hint: /did you mean `F_lim`/ },
    { slip: 'name of a step', set: 'F=3 lbf', code: 'OVERRIDE', hint: /only inputs|did you mean/ },
    { slip: 'misspelt unit', set: 'p=905 psgi', code: 'UNIT_UNKNOWN', hint: /`psig`/ },
    { slip: 'no number', set: 'dp=many', code: 'QUANTITY_SYNTAX', hint: /./ },
    { slip: 'another dimension', set: 'dp=5 mm', code: 'OVERRIDE', hint: /the sheet has `60 psi`/ },
    { slip: 'difference for a level', set: 'p=900 psi', code: 'OVERRIDE', hint: /the sheet has `900 psig`/ },
  ])('refuses a $slip as a fault of the value, once', async ({ set, code, hint }) => {
    const { status, out, err } = await run(sheetText(), ['--set', set]);
    expect(status).toBe(2);
    expect(out).toBe('');
    expect(err).toMatch(
      new RegExp(`^error\\[${code}\\]: .*\\n +--> --set ${set.slice(0, set.indexOf('='))}:1:\\d+\\n`),
    );
    expect(err).toMatch(hint);
    expect(err).toMatch(/\n1 error\n$/);
  });

  it.each(['dp', '=30 psi', 'dp='])('is wrong usage as `%s`', async (set) => {
    const { status, out, err } = await run(sheetText(), ['--set', set]);
    expect(status).toBe(3);
    expect(out).toBe('');
    expect(err).toContain(`\`--set ${set}\``);
    expect(err).toMatch(/= hint: write `--set/);
  });
});

describe('run --units', () => {
  it('shows results in SI and leaves the SI values as they are', async () => {
    const us = await reportOf(sheetText());
    const si = await reportOf(sheetText(), ['--units', 'si']);
    expect(si.quantities['F']).toMatchObject({ unit: 'N' });
    expect(si.quantities['F']?.value).toBeCloseTo(FORCE_LBF * LBF, 8);
    expect(si.quantities['D']).toMatchObject({ unit: 'mm' });
    expect(si.quantities['p']?.unit).toBe('barg');
    for (const [name, { si: value }] of Object.entries(us.quantities)) expect(si.quantities[name]?.si).toBe(value);
    expect(si.checks[0]?.utilisation).toBe(us.checks[0]?.utilisation);
  });

  it('is seen in the text as well', async () => {
    const { out } = await run(sheetText(), ['--units', 'si']);
    expect(out).toMatch(/F = dp\*A = 7546 N\b/);
    expect(out).not.toMatch(/\b(lbf|psig|in\^2)\b/);
  });
});

describe('run --out', () => {
  it('writes the report to the file and nothing to stdout', async () => {
    const { status, out, err } = await run(sheetText(), ['--out', 'report.txt'], { outIsTerminal: true });
    expect({ status, out, err }).toEqual({ status: 0, out: '', err: 'written to report.txt\n' });
    const plain = await run(sheetText());
    expect(await read('report.txt')).toBe(plain.out);
  });

  it('writes to stdout for -', async () => {
    const { status, out } = await run(sheetText(), ['--out', '-', '--format', 'json']);
    expect(status).toBe(0);
    expect(JSON.parse(out)).toMatchObject({ antinode: 'report/1' });
  });

  it('says why a file cannot be written', async () => {
    const { status, out, err } = await run(sheetText(), ['--out', 'no-such-folder/report.txt']);
    expect(status).toBe(3);
    expect(out).toBe('');
    expect(err).toContain('`no-such-folder/report.txt` cannot be written: ENOENT');
  });
});

describe('run -', () => {
  it('reads the sheet from standard input', async () => {
    const { status, out } = await cli(['run', '-'], { stdin: sheetText() });
    expect(status).toBe(0);
    expect(out).toContain('Force on a bore');
  });

  it('names standard input in the place of a fault', async () => {
    const { status, err } = await cli(['run', '-'], { stdin: sheetText({ steps: ['x: 2*nothing'] }) });
    expect(status).toBe(2);
    expect(err).toContain('--> <stdin>:18:12');
  });

  it('refuses standard input that is not UTF-8', async () => {
    const { status, err } = await cli(['run', '-'], { stdin: new Uint8Array([0x61, 0x3a, 0x20, 0xe9]) });
    expect(status).toBe(2);
    expect(err).toContain('error[FILE_NOT_UTF8]');
  });
});

describe('colour', () => {
  const terminal = { outIsTerminal: true, errIsTerminal: true };

  it('is used on a terminal', async () => {
    const { out, err } = await run(WARNED, [], terminal);
    expect(out).toMatch(ESCAPE);
    expect(err).toMatch(ESCAPE);
  });

  it('is decided for each stream by itself', async () => {
    const { out, err } = await run(WARNED, [], { errIsTerminal: true });
    expect(out).not.toMatch(ESCAPE);
    expect(err).toMatch(ESCAPE);
  });

  it.each([
    { where: 'off a terminal', args: [], options: {} },
    { where: 'with NO_COLOR', args: [], options: { ...terminal, env: { NO_COLOR: '1' } } },
    { where: 'on a dumb terminal', args: [], options: { ...terminal, env: { TERM: 'dumb' } } },
  ])('is not used $where', async ({ options }) => {
    const { out, err } = await run(WARNED, [], options);
    expect(out + err).not.toMatch(ESCAPE);
  });

  it('is not used with --no-color', async () => {
    await write('sheet.yaml', WARNED);
    const { out, err, status } = await cli(['--no-color', 'run', 'sheet.yaml'], terminal);
    expect(status).toBe(0);
    expect(out + err).not.toMatch(ESCAPE);
  });

  it('never is in the machine form', async () => {
    const { out } = await run(sheetText(), ['--format', 'json'], terminal);
    expect(out).not.toMatch(ESCAPE);
  });
});

describe('control characters of a sheet', () => {
  it('do not reach the terminal', async () => {
    const { out, err } = await run(sheetText({ inputs: ['x: { value: 3 %, label: "a\\e[31mb", source: basis }'] }));
    expect(out + err).not.toMatch(ESCAPE);
  });
});

describe('run --format html', () => {
  it('writes one file that needs nothing else', async () => {
    await ensureBuilt();
    const { status, out } = await cli(['run', EXAMPLE, '--format', 'html', '--out', 'report.html']);
    expect({ status, out }).toEqual({ status: 0, out: '' });
    const html = await read('report.html');
    expect(html).toMatch(/^<!doctype html>/);
    expect(html).toContain('Second-stage discharge lateral, shaking force');
    expect(html).not.toMatch(/<script|<link|<iframe|<img|@import/i);
    const resources = [...html.matchAll(/url\(\s*["']?([^"')]+)|(?:src|href)="([^"]*)"/g)].map(
      ([, a, b]) => a ?? b ?? '',
    );
    expect(resources.filter((address) => !/^(data:|#)/.test(address))).toEqual([]);
    expect(resources.filter((address) => /^data:font\/woff2?;base64,/.test(address)).length).toBeGreaterThan(5);
    expect(html).toContain('<math xmlns="http://www.w3.org/1998/Math/MathML"');
    expect(html).toContain('574.9');
  }, 120_000);
});
