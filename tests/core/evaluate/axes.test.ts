import { describe, expect, it } from 'vitest';
import { evaluateText, places, reportOf, sheetOf } from './sheet-text.ts';

const CONDITIONS = [
  'conditions:',
  '  source: b',
  '  columns: { p: { unit: psig, label: Pressure }, A: in^2, load: text }',
  '  rows:',
  '    C01: [100, 10, all]',
  '    C02: [200, 20, half]',
  '    C03: { p: 300 psig, A: 0.5 ft^2, load: none }',
];

function steps(given: Readonly<Record<string, string>>, ...more: readonly string[]): string {
  return sheetOf(
    ...CONDITIONS,
    'inputs:',
    '  N: { value: 600..1000 rpm step 200 rpm, source: b }',
    '  L: { value: 10 ft, source: b }',
    'sections:',
    '  - title: S',
    '    steps:',
    ...Object.entries(given).map(([name, calc]) => `      ${name}: ${JSON.stringify(calc)}`),
    ...more,
  );
}

describe('quantities over axes, by hand', () => {
  const report = reportOf(
    evaluateText(
      steps({
        // 100 psig is 114.7 psia, times 10 in²: 1147 lbf; 214.7 × 20 = 4294; 314.7 × 72 = 22658.4.
        F: 'p*A to lbf',
        f: 'harmonics(2)*N to Hz',
        // Largest over the speeds 10, 13.33, 16.67 Hz.
        top: "max_over(f, 'speed')",
        low: "min_over(f, 'harmonic')",
        middle: "mean_over(f, 'speed')",
        total: "sum_over(A, 'condition')",
        second: "at(F, 'condition', 'C02')",
        slow: "at(f, 'speed', 800 rpm)",
        part: 'where(N >= 800 rpm, F, 0 lbf)',
        worst: 'envelope(part)',
      }),
    ),
  );
  const value = (name: string): unknown => report.quantities[name]?.value;
  const close = (found: unknown, expected: unknown): void => {
    expect(round(found)).toEqual(round(expected));
  };

  it.each([
    ['p', [100, 200, 300]],
    ['A', [10, 20, 72]],
    ['F', [1147, 4294, 22658.4]],
    [
      'f',
      [
        [10, 20],
        [40 / 3, 80 / 3],
        [50 / 3, 100 / 3],
      ],
    ],
    ['top', [50 / 3, 100 / 3]],
    ['low', [10, 40 / 3, 50 / 3]],
    ['middle', [40 / 3, 80 / 3]],
    ['total', 102],
    ['second', 4294],
    ['slow', [40 / 3, 80 / 3]],
    [
      'part',
      [
        [0, 1147, 1147],
        [0, 4294, 4294],
        [0, 22658.4, 22658.4],
      ],
    ],
    ['worst', 22658.4],
  ])('%s', (name, expected) => {
    close(value(name), expected);
  });

  it('name their axes, outermost first, with their points', () => {
    expect(report.quantities['part']?.axes).toEqual([
      { name: 'condition', values: ['C01', 'C02', 'C03'] },
      { name: 'speed', values: [600, 800, 1000], unit: 'rpm' },
    ]);
    expect(report.quantities['f']?.axes.at(-1)).toEqual({ name: 'harmonic', values: [1, 2] });
  });

  it('print as the least and the greatest, and say where they are', () => {
    const block = report.sections.flatMap(({ blocks }) => blocks).find(({ path }) => path === 'sections/1/steps/F');
    expect(block).toMatchObject({
      printed: { number: '1147 … 22658', unit: 'lbf' },
      axes: ['condition'],
      at: 'C03',
      extent: { least: { at: 'C01' }, greatest: { at: 'C03' } },
    });
  });
});

describe('crank angles', () => {
  const text = sheetOf(
    'sections:',
    '  - title: S',
    '    steps:',
    '      theta: angles(8)',
    '      x: 2 in*cos(theta) + 1 in*cos(2*theta)',
    '      top: "max_over(x, \'angle\')"',
    '      low: "at(x, \'angle\', 90 deg)"',
    '    figures: [{ kind: wave, of: x }]',
  );

  it('go once round in equal steps from zero', () => {
    const { quantities } = reportOf(evaluateText(text));
    expect(quantities['theta']?.axes).toEqual([
      { name: 'angle', values: [0, 45, 90, 135, 180, 225, 270, 315], unit: 'deg' },
    ]);
    // 2 + 1 at the dead centre; −1 a quarter turn on.
    expect(round(quantities['top']?.value)).toBe(3);
    expect(round(quantities['low']?.value)).toBe(-1);
  });

  it.each(['angles(3)', 'angles(8.5)', 'angles(4000)', 'angles(8) + angles(9)'])('%s is refused', (calc) => {
    const { report } = evaluateText(text.replace('angles(8)', calc));
    expect(report).toBeNull();
  });
});

describe('checks over axes', () => {
  it('pass only if they pass everywhere, and name the governing point', () => {
    const text = steps({ F: 'p*A to lbf' }, '    checks:', '      - { that: F <= 4 kip, label: Force }');
    const report = reportOf(evaluateText(text));
    expect(report.checks[0]).toMatchObject({ status: 'fail', governing: { condition: 'C03' } });
    expect(report.checks[0]?.utilisation).toBeCloseTo(22658.4 / 4000, 10);
    const block = report.sections.flatMap(({ blocks }) => blocks).find(({ block: kind }) => kind === 'check');
    expect(block).toMatchObject({ at: 'C03', points: { all: 3, failed: 2 } });
  });

  it('may vary on both sides', () => {
    const text = steps({ lim: '(10 lbf/rpm)*N to lbf' }, '    checks:', '      - { that: p*A <= lim, label: Force }');
    // 22658.4 lbf at C03 over 6000 lbf at 600 rpm governs.
    expect(reportOf(evaluateText(text)).checks[0]).toMatchObject({ governing: { condition: 'C03', speed: 600 } });
  });
});

describe('one operating condition', () => {
  it('is evaluated alone, as an axis of one point', () => {
    const report = reportOf(evaluateText(steps({ F: 'p*A to lbf' }), { condition: 'C02' }));
    expect(report.quantities['F']?.axes).toEqual([{ name: 'condition', values: ['C02'] }]);
    expect(round(report.quantities['F']?.value)).toEqual([4294]);
  });

  it('must be one of the sheet', () => {
    const { report, diagnostics } = evaluateText(steps({ F: 'p*A' }), { condition: 'C09' });
    expect(report).toBeNull();
    expect(diagnostics).toMatchObject([{ code: 'OVERRIDE', hints: ['its conditions are C01, C02, C03'] }]);
  });
});

describe('values set from outside', () => {
  it('stand for a range as one point of its axis', () => {
    const report = reportOf(
      evaluateText(steps({ top: "max_over(N, 'speed') to Hz" }), { overrides: [{ name: 'N', value: '900 rpm' }] }),
    );
    expect(report.quantities['top']?.value).toBeCloseTo(15, 12);
  });

  it('hold for every condition where they stand for a column', () => {
    const report = reportOf(evaluateText(steps({ F: 'p*A to lbf' }), { overrides: [{ name: 'A', value: '1 in^2' }] }));
    expect(round(report.quantities['F']?.value)).toEqual([114.7, 214.7, 314.7]);
  });
});

describe('what does not fit the axes is said at its place', () => {
  it.each([
    ["max_over(L, 'speed')", 'AXIS_MISSING', 'it is a single value'],
    ["max_over(F, 'speed')", 'AXIS_MISSING', 'it varies along `condition`'],
    ["max_over(F, 'sped')", 'AXIS_UNKNOWN', "write it between quotation marks: 'speed'"],
    ['max_over(F, condition)', 'AXIS_UNKNOWN', "write it between quotation marks: 'condition'"],
    ["at(F, 'condition', 'C1')", 'AXIS_POINT', "did you mean 'C01'?"],
    ["at(N, 'speed', 900 rpm)", 'AXIS_POINT', 'it runs from 600 to 1000 rpm, in 3 points'],
    ["at(N, 'speed', 900 ft)", 'AXIS_POINT', 'such as `600 rpm`'],
    ["sum_over(p, 'condition')", 'LEVEL_SUM', 'add a difference'],
    ['envelope(L)', 'AXIS_MISSING', 'leave `envelope` out'],
    ['harmonics(2.5)', 'FUNCTION_ARGUMENTS', 'its length must be known'],
    ['harmonics(3)*harmonics(4)', 'AXIS_CONFLICT', 'all orders of one sheet are the same'],
    ['where(N, F, F)', 'FUNCTION_ARGUMENTS', 'where(a <= b'],
    ['where(N < L, F, F)', 'UNIT_MISMATCH', ''],
    ['where(N < 1 Hz, F, L)', 'UNIT_MISMATCH', ''],
    ['2*load', 'EXPRESSION_NOT_ALLOWED', 'give the column a unit'],
  ])('%s', (calc, code, hint) => {
    const { diagnostics } = evaluateText(steps({ F: 'p*A', x: calc }));
    expect(diagnostics.filter(({ severity }) => severity === 'error')).toMatchObject([{ code, line: 21 }]);
    if (hint !== '') expect(diagnostics.flatMap(({ hints }) => hints).join('\n')).toContain(hint);
  });

  it('names the case where a formula has no value, and counts the others', () => {
    const { diagnostics } = evaluateText(steps({ x: 'p/(N - 800 rpm)' }));
    expect(diagnostics).toMatchObject([
      {
        code: 'DIVISION_BY_ZERO',
        message: expect.stringContaining('(at C01, 800 rpm, and at 2 more points)') as string,
      },
    ]);
  });
});

describe('rows of operating conditions', () => {
  const rows = (...lines: readonly string[]): string => sheetOf('conditions:', ...lines);

  it.each([
    [
      'a row too short',
      rows('  source: b', '  columns: { p: psi, q: psi }', '  rows:', '    C1: [1]'),
      'CONDITIONS 11:5',
    ],
    [
      'a missing cell',
      rows('  source: b', '  rows:', '    C1: { p: 1 psi }', '    C2: { q: 1 psi }'),
      'CONDITIONS 10:5',
    ],
    [
      'a cell of another kind',
      rows('  source: b', '  columns: { p: psi }', '  rows:', '    C1: [1]', '    C2: [1 ft]'),
      'UNIT_MISMATCH 12:10',
    ],
    ['a range', rows('  source: b', '  columns: { p: psi }', '  rows:', '    C1: [1..2]'), 'QUANTITY_SYNTAX 11:10'],
    ['an unknown unit', rows('  source: b', '  columns: { p: psj }', '  rows:', '    C1: [1]'), 'UNIT_UNKNOWN 9:17'],
    ['an unknown gas', rows('  source: b', '  columns: { g: gas }', '  rows:', '    C1: [air]'), 'GAS_UNKNOWN 11:10'],
    ['neither rows nor file', rows('  source: b'), 'SCHEMA_MISSING_KEY 7:1'],
  ])('%s', (_, text, expected) => {
    expect(places(evaluateText(text))).toContain(expected);
  });

  it('warn of a column without source or hold', () => {
    expect(places(evaluateText(rows('  columns: { p: psi }', '  rows:', '    C1: [1]')))).toContain(
      'SOURCE_MISSING 8:14',
    );
  });
});

describe('operating conditions in a CSV file', () => {
  const text = sheetOf(
    'conditions: { file: c.csv, source: b, columns: { p: { label: Pressure } } }',
    'sections: [{ title: S, steps: { d: "p - 100 psig to psi" } }]',
  );

  it('have names and units in the header', () => {
    const csv = 'id, p [psig], load [text]\n# a comment\nC01, 120, "all, double"\nC02, 8 barg, half\n';
    const report = reportOf(evaluateText(text, {}, { 'c.csv': csv }));
    expect(round(report.quantities['d']?.value)).toEqual(round([20, 8e5 / 6894.757293168361 - 100]));
    expect(report.quantities['p']).toMatchObject({ label: 'Pressure', unit: 'psig' });
  });

  it.each([
    ['id,p [psig]\nC1,1..2\n', 'QUANTITY_SYNTAX'],
    ['id,p [psig]\nC1,abc\n', 'QUANTITY_SYNTAX'],
    ['id,p [psig]\nC1,\n', 'CONDITIONS'],
    ['id,p [psig]\nC1,1\nC1,2\n', 'CONDITIONS'],
    ['id,p [psig]\nC1,1,2\n', 'CONDITIONS'],
    ['id,p (psig)\nC1,1\n', 'CONDITIONS'],
    ['id,q [psig]\nC1,1\n', 'CONDITIONS'],
    ['id,p [psig]\n', 'CONDITIONS'],
    ['', 'CONDITIONS'],
    ['id,p [psig]\nC1,"1\n', 'CSV_SYNTAX'],
  ])('%j', (csv, code) => {
    const { report, diagnostics } = evaluateText(text, {}, { 'c.csv': csv });
    expect(report).toBeNull();
    const found = diagnostics.find((diagnostic) => diagnostic.code === code);
    expect(found?.severity).toBe('error');
  });

  it('must stand beside the sheet', () => {
    expect(places(evaluateText(text))).toContain('FILE_NOT_FOUND 7:21');
    expect(
      places(evaluateText(text.replace('c.csv', '../c.csv'), {}, { '../c.csv': 'id,p [psig]\nC1,1\n' })),
    ).toContain('FILE_NOT_FOUND 7:21');
  });
});

function round(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(round);
  return typeof value === 'number' ? Number(value.toPrecision(11)) : value;
}
