import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { evaluateText, reportOf, sheetOf } from '../core/evaluate/sheet-text.ts';

/** A formula of plain numbers over x (by condition) and y (by speed), and a constant k. */
const formula: fc.Arbitrary<string> = fc.letrec<{ formula: string }>((tie) => ({
  formula: fc.oneof(
    { maxDepth: 4 },
    fc.constantFrom('x', 'y', 'k', '2', '0.25', 'pi'),
    fc
      .tuple(tie('formula'), fc.constantFrom('+', '-', '*', '/'), tie('formula'))
      .map(([a, sign, b]) => `(${a} ${sign} ${b})`),
    tie('formula').map((a) => `(${a})^2`),
    tie('formula').map((a) => `abs(${a})^0.5`),
    fc.tuple(fc.constantFrom('sin', 'exp', 'atan', 'floor', 'abs'), tie('formula')).map(([name, a]) => `${name}(${a})`),
    fc
      .tuple(fc.constantFrom('min', 'max', 'mean'), tie('formula'), tie('formula'))
      .map(([name, a, b]) => `${name}(${a}, ${b})`),
    fc.tuple(tie('formula'), tie('formula'), tie('formula')).map(([a, b, c]) => `where(${a} <= ${b}, ${c}, ${a})`),
  ),
})).formula;

const XS = [-2.5, 0, 1, 3.75];
const YS = [1, 2.5, 4, 5.5, 7];

function sheet(calc: string, x: readonly string[], y: string): string {
  return sheetOf(
    'conditions:',
    '  columns: { x: { unit: "1", source: b } }',
    '  rows:',
    ...x.map((value, i) => `    C${i}: [${value}]`),
    'inputs:',
    `  N: { value: ${y}, source: b }`,
    '  k: { value: 1.7, source: b }',
    'sections:',
    '  - title: S',
    '    steps:',
    '      y: N/(1 rpm)',
    `      z: ${JSON.stringify(calc)}`,
  );
}

describe('a formula over axes', () => {
  it('has in every cell the very digits of the formula on that cell alone', () => {
    fc.assert(
      fc.property(formula, (calc) => {
        const whole = evaluateText(sheet(calc, XS.map(String), '1..7 rpm step 1.5 rpm'));
        const cells = XS.flatMap((x) =>
          YS.map((y) => {
            const report = evaluateText(sheet(calc, [String(x)], `${y} rpm`)).report;
            return report === null ? undefined : first(report.quantities['z']?.si);
          }),
        );
        if (cells.includes(undefined)) {
          expect(whole.report).toBeNull();
          return;
        }
        const found = reportOf(whole).quantities['z'];
        const axes = found?.axes.map(({ name }) => name) ?? [];
        XS.forEach((_, i) =>
          YS.forEach((__, j) => {
            const at = axes.map((name) => (name === 'condition' ? i : j));
            const cell = at.reduce<unknown>((part, index) => (part as readonly unknown[])[index], found?.si);
            expect(cell).toBe(cells[i * YS.length + j]);
          }),
        );
      }),
      { numRuns: 100, seed: 1907 },
    );
  }, 60_000);
});

describe('a sheet', () => {
  const step = fc.constantFrom('a + b', 'a*2', 'b/a', 'max(a, b)', 'c^2');
  const steps = fc.dictionary(fc.constantFrom('d', 'e_1', 'f', 'g'), step, { minKeys: 1 });
  const text = (lines: readonly string[]): string =>
    sheetOf(
      'inputs:',
      '  a: { value: 2, source: b }',
      '  b: { value: 3, source: b }',
      'sections:',
      '  - title: S',
      '    steps:',
      ...lines,
    );

  it('gives the same results whatever the order of its steps', () => {
    fc.assert(
      fc.property(steps, fc.nat(), (given, turn) => {
        const lines = ['      c: a*b', ...Object.entries(given).map(([name, calc]) => `      ${name}: ${calc}`)];
        const turned = [...lines.slice(turn % lines.length), ...lines.slice(0, turn % lines.length)].toReversed();
        const [one, other] = [lines, turned].map((each) => reportOf(evaluateText(text(each))).quantities);
        for (const name of Object.keys(one ?? {})) expect(other?.[name]?.si).toBe(one?.[name]?.si);
        for (const name of Object.keys(one ?? {})) expect(other?.[name]?.digest).toBe(one?.[name]?.digest);
      }),
      { numRuns: 60, seed: 7 },
    );
  });

  it('keeps its digest under comments and another order of keys', () => {
    const base = text(['      c: { calc: a*b, label: Product, unit: "1" }']);
    const other = base
      .replace('{ calc: a*b, label: Product, unit: "1" }', '{ unit: "1", label: Product, calc: a*b } # a remark')
      .replace('units: us', '# another remark\nunits: us')
      .replace('{ value: 2, source: b }', '{ source: b, value: 2 }');
    expect(other).not.toBe(base);
    expect(reportOf(evaluateText(other)).sheet.digest).toBe(reportOf(evaluateText(base)).sheet.digest);
    const changed = base.replace('value: 2', 'value: 2.5');
    expect(reportOf(evaluateText(changed)).sheet.digest).not.toBe(reportOf(evaluateText(base)).sheet.digest);
  });
});

function first(nested: unknown): number | undefined {
  if (typeof nested === 'number') return nested;
  return Array.isArray(nested) ? first(nested[0]) : undefined;
}
