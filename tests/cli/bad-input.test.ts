import { mkdir } from 'node:fs/promises';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import type { LocatedDiagnostic } from '../../core/report/model.ts';
import { makeWorkplace, type Ended } from './harness.ts';
import { sheetText } from './sheets.ts';

const { cli, write, folder } = makeWorkplace();

/** Stands in a sheet's text where its fault is to be shown; it is taken out before the sheet is written. */
const HERE = '⟦';

interface Fault {
  readonly fault: string;
  readonly code: string;
  readonly sheet: string;
  /** What a hint must say; absent where the message leaves nothing to add. */
  readonly hint?: RegExp;
}

const lines = (...text: readonly string[]): string => `${text.join('\n')}\n`;

/** A gas and a temperature, for formulas that need them. */
const METHANE = {
  top: ['gases: { gas: { method: ideal, fractions: { methane: 100 % }, source: basis } }'],
  inputs: ['T: { value: 120 degF, source: basis }'],
};

const FAULTS: readonly Fault[] = [
  {
    fault: 'wrong indent',
    code: 'YAML_SYNTAX',
    sheet: sheetText({ top: ['sources:', '  practice: Common practice', `${HERE} basis: Design basis`] }).replace(
      'sources:\n  basis: Design basis\n',
      '',
    ),
    hint: /indent/,
  },
  {
    fault: 'unknown key',
    code: 'SCHEMA_UNKNOWN_KEY',
    sheet: sheetText({ inputs: [`T: { value: 120 degF, ${HERE}lable: Temperature, source: basis }`] }),
    hint: /did you mean `label`/,
  },
  {
    fault: 'misspelt unit',
    code: 'UNIT_UNKNOWN',
    sheet: sheetText({ inputs: [`p_2: { value: 905 ${HERE}psgi, source: basis }`] }),
    hint: /did you mean .*`psig`/,
  },
  {
    fault: 'length where a pressure is wanted',
    code: 'UNIT_MISMATCH',
    sheet: sheetText({ ...METHANE, steps: [`c: speed_of_sound(gas, ${HERE}D, T)`] }),
  },
  {
    fault: 'length to be shown as a pressure',
    code: 'UNIT_MISMATCH',
    sheet: sheetText({ steps: [`x: 2*D to ${HERE}psi`] }),
  },
  {
    fault: 'level plus level',
    code: 'LEVEL_SUM',
    sheet: sheetText({ steps: [`twice: ${HERE}p + p`] }),
    hint: /difference/,
  },
  {
    fault: 'difference where a level is wanted',
    code: 'LEVEL_WANTED',
    sheet: sheetText({ ...METHANE, steps: [`c: speed_of_sound(gas, ${HERE}dp, T)`] }),
    hint: /psia|psig/,
  },
  {
    fault: 'unknown name',
    code: 'NAME_UNKNOWN',
    sheet: sheetText({ checks: [`{ that: F <= ${HERE}F_limt, source: basis }`] }),
    hint: /did you mean `F_lim`/,
  },
  {
    fault: 'circle of three',
    code: 'CIRCLE',
    sheet: sheetText({ steps: [`${HERE}a: 2*b`, 'b: 3*d', 'd: a/4'] }),
  },
  {
    fault: 'division by zero',
    code: 'DIVISION_BY_ZERO',
    sheet: sheetText({ inputs: ['zero: { value: 0 in, source: basis }'], steps: [`x: D/${HERE}zero`] }),
  },
  {
    fault: 'source id that is not listed',
    code: 'SOURCE_UNKNOWN',
    sheet: sheetText({ inputs: [`T: { value: 120 degF, source: ${HERE}bases }`] }),
    hint: /did you mean `basis`/,
  },
  {
    fault: 'alias bomb',
    code: 'YAML_ALIAS',
    sheet: lines(
      'antinode: sheet/1',
      'number: T-001',
      'title: Bomb',
      'units: us',
      'assumptions:',
      `  - &a0 ${HERE}"ha"`,
      ...Array.from(
        { length: 12 },
        (_, i) => `  - &a${i + 1} [${Array.from({ length: 10 }, () => `*a${i}`).join(', ')}]`,
      ),
    ),
  },
  {
    fault: 'sheet of 5 MB',
    code: 'FILE_TOO_LARGE',
    sheet: HERE + sheetText() + `# ${'x'.repeat(77)}\n`.repeat(62_500),
    hint: /split/,
  },
  {
    fault: 'expression 10,000 deep',
    code: 'EXPRESSION_TOO_LARGE',
    sheet: sheetText({ steps: [`deep: ${HERE}${'('.repeat(10_000)}1${')'.repeat(10_000)}`] }),
  },
  {
    fault: 'number too large for any computer',
    code: 'NUMBER_NOT_FINITE',
    sheet: sheetText({ inputs: [`n: { value: ${HERE}1e999, source: basis }`] }),
  },
  {
    fault: 'number too large, with a unit',
    code: 'NUMBER_NOT_FINITE',
    sheet: sheetText({ inputs: [`n: { value: ${HERE}1e999 psi, source: basis }`] }),
  },
  {
    fault: 'tab for indent',
    code: 'YAML_TAB',
    sheet: sheetText({ top: ['assumptions:', `${HERE}\t- The gas is ideal`] }),
    hint: /spaces/,
  },
  {
    fault: 'duplicate key',
    code: 'YAML_DUPLICATE_KEY',
    sheet: sheetText({ inputs: [`${HERE}dp: { value: 50 psi, source: basis }`] }),
  },
];

interface Placed {
  readonly text: string;
  readonly line: number;
  readonly column: number;
}

function place(sheet: string): Placed {
  const before = sheet.slice(0, sheet.indexOf(HERE)).split('\n');
  return { text: sheet.replace(HERE, ''), line: before.length, column: (before.at(-1) ?? '').length + 1 };
}

function expectNoStackTrace({ out, err }: Ended): void {
  expect(out + err).not.toMatch(/^\s*at .*\(.*\)$|^\s*at (file|node):/m);
  expect(err).not.toContain('fault of Antinode');
}

/** The codes in the human form, each with the place that follows it. */
function reported(err: string): string[] {
  return [...err.matchAll(/^(?:error|warning)\[(\w+)\]: .+\n +--> (.+)$/gm)].map(([, code, at]) => `${code} ${at}`);
}

interface FailedReport {
  readonly antinode: string;
  readonly core: string;
  readonly sheet: unknown;
  readonly quantities: unknown;
  readonly checks: unknown;
  readonly holds: unknown;
  readonly diagnostics: readonly LocatedDiagnostic[];
}

function expectFailedReport(out: string): readonly LocatedDiagnostic[] {
  const { diagnostics, ...rest } = JSON.parse(out) as FailedReport;
  expect(rest).toEqual({
    antinode: 'report/1',
    core: expect.stringMatching(/^\d+\.\d+\.\d+/) as string,
    sheet: { number: '', title: '', digest: '' },
    axes: [],
    quantities: {},
    checks: [],
    holds: [],
  });
  return diagnostics;
}

describe.each(FAULTS)('$fault', ({ code, sheet, hint }) => {
  const { text, line, column } = place(sheet);
  const name = `${code.toLowerCase()}.yaml`;

  it(`is told to people as ${code}, with its place`, async () => {
    await write(name, text);
    const ended = await cli(['run', name]);
    expect(ended.status).toBe(2);
    expect(ended.out).toBe('');
    expect(reported(ended.err)).toEqual([`${code} ${name}:${line}:${column}`]);
    if (hint !== undefined) expect(ended.err).toMatch(new RegExp(`= hint: .*(?:${hint.source})`));
    expect(ended.err).toMatch(/\n1 error\n$/);
    expectNoStackTrace(ended);
  });

  it('is the same for machines, in a report that holds nothing else', async () => {
    await write(name, text);
    const ended = await cli(['run', name, '--format', 'json']);
    expect(ended.status).toBe(2);
    const diagnostics = expectFailedReport(ended.out);
    expect(diagnostics).toHaveLength(1);
    expect(diagnostics[0]).toMatchObject({ code, severity: 'error', file: name, line, column });
    if (hint !== undefined) expect(diagnostics[0]?.hints.join('\n')).toMatch(hint);
    expectNoStackTrace(ended);
  });

  it('is found by lint as well', async () => {
    await write(name, text);
    const ended = await cli(['lint', name]);
    expect(ended).toMatchObject({ status: 2, out: '' });
    expect(reported(ended.err)).toEqual([`${code} ${name}:${line}:${column}`]);
  });
});

describe('a file that is no sheet', () => {
  const cases = [
    {
      fault: 'file missing',
      make: () => write('discharge.yaml', sheetText()),
      file: 'dicharge.yaml',
      code: 'FILE_NOT_FOUND',
      place: '1:1',
      hint: 'did you mean `discharge.yaml`?',
    },
    {
      fault: 'folder in place of a file',
      make: () => mkdir(join(folder, 'study'), { recursive: true }),
      file: 'study',
      code: 'FILE_NOT_READABLE',
      place: '1:1',
      hint: 'name the sheet in it',
    },
    {
      fault: 'file that is not UTF-8',
      make: () => write('latin.yaml', Buffer.from('antinode: sheet/1\ntitle: D\u00e9bit\n', 'latin1')),
      file: 'latin.yaml',
      code: 'FILE_NOT_UTF8',
      place: '2:9',
      hint: 'save it as UTF-8',
    },
  ];

  it.each(cases)('$fault', async ({ make, file, code, place: at, hint }) => {
    await make();
    const ended = await cli(['run', file]);
    expect(ended).toMatchObject({ status: 2, out: '' });
    expect(reported(ended.err)).toEqual([`${code} ${file}:${at}`]);
    expect(ended.err).toContain(`= hint: ${hint}`);
    expectNoStackTrace(ended);

    const machine = await cli(['run', file, '--format', 'json']);
    expect(machine.status).toBe(2);
    const diagnostics = expectFailedReport(machine.out);
    expect(diagnostics.map((found) => `${found.code} ${found.file}:${found.line}:${found.column}`)).toEqual([
      `${code} ${file}:${at}`,
    ]);
  });

  it('is told for every file of a lint, and the others are read all the same', async () => {
    await write('good.yaml', sheetText());
    await write('bad.yaml', sheetText({ steps: ['x: dp*unknown'] }));
    const ended = await cli(['lint', 'none.yaml', 'bad.yaml', 'good.yaml']);
    expect(ended.status).toBe(2);
    expect(reported(ended.err)).toEqual(['FILE_NOT_FOUND none.yaml:1:1', 'NAME_UNKNOWN bad.yaml:18:13']);
  });
});

describe('several faults in one sheet', () => {
  const faulty = sheetText({
    inputs: ['p_2: { value: 905 psgi, source: bases }'],
    steps: ['x: dp + D', 'y: dp*unknown', 'twice: p + p'],
    checks: ['{ that: F <= F_limt }'],
  });

  it('are all told in one run', async () => {
    await write('faulty.yaml', faulty);
    const ended = await cli(['run', 'faulty.yaml']);
    expect(ended).toMatchObject({ status: 2, out: '' });
    expect(
      reported(ended.err)
        .map((text) => text.split(' ')[0])
        .sort(),
    ).toEqual(['LEVEL_SUM', 'NAME_UNKNOWN', 'NAME_UNKNOWN', 'SOURCE_UNKNOWN', 'UNIT_MISMATCH', 'UNIT_UNKNOWN']);
    expect(ended.err).toMatch(/\n6 errors\n$/);
  });

  it('are all in the machine form', async () => {
    await write('faulty.yaml', faulty);
    const ended = await cli(['run', 'faulty.yaml', '--format', 'json']);
    expect(expectFailedReport(ended.out)).toHaveLength(6);
  });
});
