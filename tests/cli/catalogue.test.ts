import { describe, expect, it } from 'vitest';
import { MATHEMATICS } from '../../core/expression/mathematics.ts';
import { LIBRARY } from '../../core/library/catalogue.ts';
import type { LibraryFunction } from '../../core/library/function.ts';
import type { Report } from '../../core/report/model.ts';
import { ALL_UNITS } from '../../core/units/table.ts';
import { makeWorkplace } from './harness.ts';
import { sheetText } from './sheets.ts';

const { cli } = makeWorkplace();

interface FunctionsAnswer {
  readonly antinode: string;
  readonly functions: readonly Omit<LibraryFunction, 'evaluate'>[];
}

interface ConversionAnswer {
  readonly antinode: string;
  readonly value: number;
  readonly unit: string;
  readonly dimension: string;
  readonly conversions: readonly { readonly unit: string; readonly value: number }[];
}

describe('functions', () => {
  it('lists every function by its head, with what it is, under its topic', async () => {
    const { status, out, err } = await cli(['functions']);
    expect({ status, err }).toEqual({ status: 0, err: '' });
    const rows = out.split('\n');
    for (const { name, parameters, summary, topic } of LIBRARY.values()) {
      const head = `${name}(${parameters.map((parameter) => parameter.name).join(', ')})`;
      const row = rows.findIndex((line) => line.startsWith(`  ${head} `));
      expect(rows[row]).toContain(summary);
      const heading = rows.slice(0, row).findLast((line) => /^\w/.test(line));
      expect(heading).toBe(topic);
    }
    for (const name of MATHEMATICS.keys()) expect(out).toMatch(new RegExp(`  .*\\b${name}\\b`));
    expect(out).toMatch(/constants: .*\bpi\b/);
  });

  it('lists them for machines', async () => {
    const { status, out } = await cli(['functions', '--format', 'json']);
    const answer = JSON.parse(out) as FunctionsAnswer;
    expect({ status, antinode: answer.antinode }).toEqual({ status: 0, antinode: 'functions/1' });
    expect(answer.functions.map(({ name }) => name)).toEqual([...LIBRARY.keys()]);
    for (const fn of answer.functions) expect(fn).not.toHaveProperty('evaluate');
  });

  it.each([...LIBRARY.values()].map((fn) => [fn.name, fn] as const))('%s tells all about itself', async (name, fn) => {
    const { status, out } = await cli(['functions', name]);
    expect(status).toBe(0);
    for (const text of [fn.summary, fn.formula, fn.validity, fn.source, fn.returns.summary])
      expect(out).toContain(text);
    for (const parameter of fn.parameters) expect(out).toContain(parameter.summary);
    expect(out).toContain(`${fn.example.call} = ${fn.example.result}`);
  });

  it('tells about one function for machines', async () => {
    const { out } = await cli(['functions', 'pipe_bore', '--format', 'json']);
    const { antinode, functions } = JSON.parse(out) as FunctionsAnswer;
    expect(antinode).toBe('functions/1');
    expect(functions).toMatchObject([{ name: 'pipe_bore', returns: { unit: 'in' } }]);
  });

  it('tells about the functions of mathematics as well', async () => {
    const { status, out } = await cli(['functions', 'sqrt']);
    expect(status).toBe(0);
    expect(out).toMatch(/^sqrt\(x\)\n {2}Square root\n[^]*takes[^]*example {3}sqrt\(9 m\^2\) = 3 m\n$/);
  });

  it('tells about the functions along axes, alone and together', async () => {
    expect((await cli(['functions', 'max_over'])).out).toContain('max_over(x, axis)');
    const { out } = await cli(['functions', 'axes']);
    for (const name of ['max_over', 'envelope', 'where', 'interpolate', 'harmonics']) expect(out).toContain(`${name}(`);
    expect(JSON.parse((await cli(['functions', 'where', '--format', 'json'])).out)).toMatchObject({
      functions: [{ name: 'where', topic: 'axes' }],
    });
  });

  it('lists one topic in full', async () => {
    const { out } = await cli(['functions', 'pipe']);
    expect(out).toContain('pipe_bore(nps, schedule)');
    expect(out).not.toContain('speed_of_sound');
  });

  it.each([
    ['pipe_boer', 'did you mean `pipe_bore`'],
    ['zzzzzz', '`antinode functions` lists all'],
  ])('has no %s', async (name, hint) => {
    const { status, out, err } = await cli(['functions', name]);
    expect({ status, out }).toEqual({ status: 3, out: '' });
    expect(err).toContain(`error: there is no function \`${name}\`\n`);
    expect(err).toContain(`  = hint: ${hint}`);
  });
});

describe('the example of every function', () => {
  it.each([...LIBRARY.values()].map(({ name, example }) => [name, example] as const))(
    'of %s gives its stated result in a sheet',
    async (_, { call, result }) => {
      const sheet = sheetText({
        top: ['gases: { methane: { method: ideal, fractions: { methane: 100 % }, source: basis } }'],
        steps: [`example: "${call}"`],
      });
      // Results in US units unless the example states its result in another: the sheet shows it there.
      const unit = result.split(' ')[1];
      const shown = unit === undefined ? sheet : sheet.replace(`"${call}"`, `"${call} to ${unit}"`);
      const { status, out, err } = await cli(['run', '-', '--format', 'json'], { stdin: shown });
      expect({ status, err }).toEqual({ status: 0, err: '' });
      const { number, unit: printedUnit } = (JSON.parse(out) as Report).quantities['example']?.printed ?? {};
      expect([number, printedUnit].filter((part) => part !== '').join(' ')).toBe(result);
    },
  );
});

describe('units', () => {
  it('lists every unit', async () => {
    const { status, out, err } = await cli(['units']);
    expect({ status, err }).toEqual({ status: 0, err: '' });
    const words = new Set(out.split(/\s+/));
    expect(ALL_UNITS.map(({ text }) => text).filter((text) => !words.has(text))).toEqual([]);
    expect(out).toMatch(/levels: .*\bpsia\b.*\bpsig\b/);
    expect(out).toMatch(/differences: .*\bpsi\b/);
  });

  it('lists them for machines, with their factors', async () => {
    const { out } = await cli(['units', '--format', 'json']);
    const { antinode, units } = JSON.parse(out) as { antinode: string; units: { unit: string; factor: number }[] };
    expect(antinode).toBe('units/1');
    expect(units).toHaveLength(ALL_UNITS.length);
    // NIST SP 811, appendix B.8: inch exactly 0.0254 m, pound-force exactly 4.448 221 615 260 5 N.
    const factor = (unit: string): number | undefined => units.find((entry) => entry.unit === unit)?.factor;
    expect(factor('in')).toBe(0.0254);
    expect(factor('lbf')).toBe(4.4482216152605);
  });

  it('shows a pressure level in every other unit of levels, and no difference', async () => {
    const { status, out } = await cli(['units', '905', 'psia']);
    expect(status).toBe(0);
    expect(out).toMatch(/^905 psia: pressure level\n/);
    expect(out).toMatch(/\s62\.39755 bara\n/);
    expect(out).toMatch(/\s890\.3041 psig\n/);
    expect(out).toContain('gauge readings at the standard atmosphere');
    expect(out).not.toMatch(/ psi\n/);
  });

  it('shows values for machines', async () => {
    const { out } = await cli(['units', '905 psia', '--format', 'json']);
    const { conversions, ...value } = JSON.parse(out) as ConversionAnswer;
    expect(value).toEqual({ antinode: 'conversion/1', value: 905, unit: 'psia', dimension: 'pressure level' });
    // 905 lbf/in^2 by the exact pound-force and inch; a gauge reading is less by 101 325 Pa.
    const pascal = (905 * 4.4482216152605) / 0.0254 ** 2;
    const of = (unit: string): number => conversions.find((entry) => entry.unit === unit)?.value ?? Number.NaN;
    expect(of('bara')).toBeCloseTo(pascal / 1e5, 10);
    expect(of('barg')).toBeCloseTo((pascal - 101_325) / 1e5, 10);
  });

  it.each([
    ['120 degF', /^120 degF: temperature level\n/, /\s48\.88889 degC\n/],
    ['15 ft 4 in', /: length\n/, /\s4\.673600 m\n/],
    ['1200 rpm', /^1200 rpm: frequency\n/, /\s20\.00000 Hz\n/],
    ['-40 degC', /^-40 degC: temperature level\n/, /\s-40\.00000 degF\n/],
    ['psi', /^1 psi: pressure difference\n/, /\s6\.894757 kPa\n/],
  ])('reads `%s`', async (text, head, row) => {
    const { status, out } = await cli(['units', ...text.split(' ')]);
    expect(status).toBe(0);
    expect(out).toMatch(head);
    expect(out).toMatch(row);
  });

  it('points at a misspelt unit', async () => {
    const { status, out, err } = await cli(['units', '905', 'psgi']);
    expect({ status, out }).toEqual({ status: 2, out: '' });
    expect(err).toMatch(/^error\[UNIT_UNKNOWN\]: .*\n +--> argument:1:5\n/);
    expect(err).toMatch(/= hint: did you mean .*`psig`/);
  });

  it('points at it for machines', async () => {
    const { status, out } = await cli(['units', '905', 'psgi', '--format', 'json']);
    expect(status).toBe(2);
    expect(JSON.parse(out)).toMatchObject({ antinode: 'diagnostics/1', diagnostics: [{ code: 'UNIT_UNKNOWN' }] });
  });
});
