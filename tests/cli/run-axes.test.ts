import { describe, expect, it } from 'vitest';
import type { Report } from '../../core/report/model.ts';
import { axesSheet, type AxesSheetParts } from '../core/report/axes-sheet.ts';
import { makeWorkplace, type Ended } from './harness.ts';

const { cli, write } = makeWorkplace();

async function run(parts: AxesSheetParts = {}, ...args: string[]): Promise<Ended> {
  await write('sheet.yaml', axesSheet(parts));
  return cli(['run', 'sheet.yaml', ...args]);
}

const LBF = 4.4482216152605;

/** Speeds from 600 rpm in steps of 10: 61 points. */
const SPEEDS: AxesSheetParts = {
  inputs: { N: '{ value: 600..1200 rpm step 10 rpm, source: basis }' },
  steps: { G: '{ calc: F*(N/(1200 rpm)), unit: lbf }' },
};

describe('run --format text over axes', () => {
  it('shows the operating conditions as one table, and under it what the columns are', async () => {
    const { out } = await run();
    expect(out).toContain(
      [
        'Operating conditions',
        '',
        '         dp  loading',
        '        psi',
        '   C01   60  all',
        '   C02   50  half',
        '',
        '   dp       Differential pressure  Design basis',
        '   loading                         Design basis',
        '',
      ].join('\n'),
    );
  });

  it('says of steps where least and greatest are, and that a value is not what is expected', async () => {
    const { out } = await run();
    expect(out).toContain('F = dp*A = 1500 … 1800 lbf\n');
    expect(out).toContain('least 1500 lbf at C02, greatest 1800 lbf at C01');
    expect(out).toContain('△ outside of what is expected: 1600..1900 lbf');
    expect((await run({ rows: ['C01: [60, all]'] })).out).not.toContain('outside of what is expected');
  });

  it('says of checks where they govern, and at how many points they fail', async () => {
    const { out, status } = await run();
    expect(status).toBe(1);
    expect(out).toMatch(/Force +F <= lim +1\.06 +▲ over\n +governs at C01 · fails at 1 of 2\n/);
    expect(out).toContain('1 check of 1 over · governs 1.06 Force at C01');
  });

  it('shows tolerances, tables to look up in, tables, and statements', async () => {
    const { out } = await run({
      top: [
        'tables: { loss: { columns: { b: "1", h: mm }, rows: [[0, 1], [1, 3]], label: Loss, source: basis } }',
        'exclusions: [Wind loads]',
        'references: [Handbook of pipes]',
      ],
      section: ['tables: [{ of: [dp, F, A], title: Forces }]'],
    });
    expect(out).toMatch(/Pulsation +x +10 % +± 5 % +Design basis\n/);
    expect(out).toContain('   Loss, loss  Design basis\n   b   h\n      mm\n   0   1\n   1   3\n');
    expect(out).toContain(
      '   Forces\n         dp     F     A\n        psi   lbf  in^2\n   C01   60  1800    30\n   C02   50  1500    30\n',
    );
    expect(out).toContain('   1. Wind loads\n');
    expect(out).toContain('   1. Handbook of pipes\n');
  });

  it('thins a long figure, keeps its greatest value, and says so', async () => {
    const { out } = await run({
      ...SPEEDS,
      section: ['figures: [{ kind: line, of: G, limit: lim, title: Force by speed }]'],
    });
    const [figure = ''] = /Force by speed[^]*?\n +greatest.*/.exec(out) ?? [];
    const lines = figure.split('\n');
    expect(lines[1]).toMatch(/speed rpm +C01 +C02 +limit$/);
    // At 600 rpm half of 1800 and of 1500 lbf; at 1200 rpm all of it.
    expect(lines[2]).toMatch(/ 600 +900\.0 +750\.0 +1700$/);
    expect(figure).toMatch(/ 1200 +1800 +1500 +1700\n/);
    expect(lines.filter((line) => /^ +\d+ +[\d.]+ +[\d.]+ +1700$/.test(line)).length).toBeLessThanOrEqual(24);
    expect(figure).toMatch(/\d+ of 61 rows, the greatest value among them; `--format json` has all/);
    expect(figure).toMatch(/greatest 1800 lbf at C01, 1200 rpm$/);
  });

  it('shows a matrix as a grid of its second axis against its first', async () => {
    const { out } = await run({
      inputs: { N: '{ value: 600..1200 rpm step 300 rpm, source: basis }' },
      steps: { G: '{ calc: F*(N/(1200 rpm)), unit: lbf }' },
      section: ['figures: [{ kind: matrix, of: G, title: Forces }]'],
    });
    expect(out).toContain(
      'Forces  matrix, in lbf\n   speed rpm    600   900  1200\n   C01        900.0  1350  1800\n   C02        750.0  1125  1500\n',
    );
  });

  it('keeps to its width and sets no two blank lines', async () => {
    const columns = Array.from({ length: 14 }, (_, i) => `quantity_${i}: { calc: ${i + 1}*dp }`);
    const { out } = await run({
      ...SPEEDS,
      steps: {
        ...SPEEDS.steps,
        ...Object.fromEntries(columns.map((line) => line.split(/: (.*)/) as [string, string])),
      },
      section: [
        `tables: [{ of: [${columns.map((line) => line.split(':')[0]).join(', ')}] }]`,
        'figures: [{ kind: line, of: G }]',
      ],
      inputs: { ...SPEEDS.inputs, y: `{ value: 1 mm, source: basis, note: ${'many words '.repeat(30)} }` },
    });
    expect(out).not.toMatch(/\n\n\n/);
    expect(out.split('\n').filter((line) => line.length > 88 && !line.startsWith('http'))).toEqual([]);
  });

  it('lets nothing through that a terminal would obey', async () => {
    const { out } = await run({ section: ['figures: [{ kind: line, of: F, title: "a\\e[31mb" }]'] });
    expect(out).toContain('a<U+001B>[31mb');
    expect(out).not.toContain('\u001B');
  });
});

describe('run --format csv', () => {
  const rowsOf = (text: string): string[] => text.split('\r\n');

  it('gives a row for each quantity and point, with the axes that the sheet has', async () => {
    const { out } = await run({}, '--format', 'csv');
    const [head, ...rows] = rowsOf(out);
    expect(head).toBe('name,label,condition,value,unit,si');
    expect(rows.at(-1)).toBe('');
    const [f1 = '', f2 = ''] = rows.filter((row) => row.startsWith('F,'));
    expect(f1.split(',').slice(0, 3)).toEqual(['F', 'F', 'C01']);
    expect(f2.split(',').slice(0, 3)).toEqual(['F', 'F', 'C02']);
    expect(Number(f1.split(',')[3])).toBeCloseTo(1800, 9);
    expect(f1.split(',')[4]).toBe('lbf');
    expect(Number(f1.split(',')[5])).toBeCloseTo(1800 * LBF, 8);
    expect(rows).toContainEqual(expect.stringMatching(/^A,Area,,30,in\^2,0\.01935/) as string);
  });

  it('names the unit of an axis in the head', async () => {
    const { out } = await run(SPEEDS, '--format', 'csv');
    expect(rowsOf(out)[0]).toBe('name,label,condition,speed [rpm],value,unit,si');
    expect(rowsOf(out).filter((row) => row.startsWith('G,'))).toHaveLength(2 * 61);
    expect(rowsOf(out)).toContainEqual(expect.stringMatching(/^G,G,C02,900,1125(\.0+\d+)?,lbf,/) as string);
  });

  it('numbers have all their digits', async () => {
    const { out } = await run(
      { inputs: { z: '{ value: 1 in, source: basis }' }, steps: { t: 'z/3 to in' } },
      '--format',
      'csv',
    );
    const [row = ''] = rowsOf(out).filter((line) => line.startsWith('t,'));
    expect(row.split(',')[3]).toMatch(/^0\.3333333333333\d+$/);
  });

  it('quotes what RFC 4180 says must be', async () => {
    const inputs = { q: `{ value: 1 mm, source: basis, label: 'Bore, "nominal"' }` };
    expect((await run({ inputs }, '--format', 'csv')).out).toContain('q,"Bore, ""nominal""",,1,mm,0.001\r\n');
  });

  it.each(['=1+1', '+1', '-1', '@SUM(A1)'])('does not let a spreadsheet compute the text `%s`', async (label) => {
    const inputs = { q: `{ value: -2 mm, source: basis, label: '${label}' }` };
    expect((await run({ inputs }, '--format', 'csv')).out).toContain(`q,'${label},,-2,mm,-0.002\r\n`);
  });

  it('writes nothing for a sheet that is wrong', async () => {
    expect(await run({ steps: { w: '2*nothing' } }, '--format', 'csv')).toMatchObject({ status: 2, out: '' });
  });
});

describe('run --condition', () => {
  it('evaluates one operating condition alone', async () => {
    const { out, status } = await run({}, '--condition', 'C02', '--format', 'json');
    const { axes, checks } = JSON.parse(out) as Report;
    expect(axes).toEqual([{ name: 'condition', values: ['C02'] }]);
    expect(checks).toMatchObject([{ status: 'pass', utilisation: expect.closeTo(1500 / 1700, 9) as number }]);
    expect(status).toBe(0);
    expect((await run({}, '--condition', 'C02')).out).not.toContain('C01');
  });

  it('refuses one that the sheet does not have, and says which it has', async () => {
    const { status, err, out } = await run({}, '--condition', 'C9');
    expect({ status, out }).toEqual({ status: 2, out: '' });
    expect(err).toContain('no operating condition `C9`');
    expect(err).toContain('C01, C02');
  });
});
