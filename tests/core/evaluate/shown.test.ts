import { describe, expect, it } from 'vitest';
import type { Block } from '../../../core/report/model.ts';
import { evaluateText, places, reportOf, sheetOf } from './sheet-text.ts';

const SHEET = (...section: readonly string[]): string =>
  sheetOf(
    'conditions: { source: b, columns: { q: psi }, rows: { C1: [1], C2: [2] } }',
    'inputs: { N: { value: 1..3 rpm step 1 rpm, source: b }, L: { value: 12 in, source: b } }',
    'tables: { k: { columns: { x: "1", y: mm }, rows: [[1, 10], [2, 30], [4, 50]], source: b } }',
    'exclusions: [Valve flutter]',
    'references: [API 688]',
    'sections:',
    '  - title: S',
    '    steps: { F: "q*(N/(1 rpm))*1 in^2 to lbf", t: "max_over(F, \'speed\')", r: "interpolate(k, 3) to mm" }',
    ...section,
  );

function block(text: string, path: string): Block {
  const found = reportOf(evaluateText(text))
    .sections.flatMap(({ blocks }) => blocks)
    .find((each) => each.path === path);
  if (found === undefined) throw new Error(`no block ${path}`);
  return found;
}

describe('values in prose', () => {
  it('stand in the place of their names', () => {
    const text = SHEET('    text: "F runs from {{ F }}, L is {{L}}, {{ r }}."');
    expect(block(text, 'sections/1/text')).toMatchObject({
      markdown: 'F runs from 1.000 to 6.000\u00A0lbf, L is 12\u00A0in, 40.00\u00A0mm.',
      uses: ['sections/1/steps/F', 'inputs/L', 'sections/1/steps/r'],
    });
  });

  it('must be known', () => {
    expect(places(evaluateText(SHEET('    text: "F is {{ FF }}."')))).toEqual(['NAME_UNKNOWN 15:17']);
  });
});

describe('tables of results', () => {
  it('have a row for each point of their axis', () => {
    expect(block(SHEET('    tables: [{ of: [q, t, L], title: All }]'), 'sections/1/tables/1')).toMatchObject({
      label: 'All',
      axis: 'condition',
      columns: [
        { name: 'q', unit: 'psi' },
        { name: 't', unit: 'lbf' },
        { name: 'L', unit: 'in' },
      ],
      rows: [
        { at: 'C1', cells: ['1', '3.000', '12'] },
        { at: 'C2', cells: ['2', '6.000', '12'] },
      ],
    });
  });

  it.each([
    ['[q, F]', 'FIGURE_AXES 15:24'],
    ['[q, N]', 'FIGURE_AXES 15:24'],
    ['[q, z]', 'NAME_UNKNOWN 15:24'],
  ])('refuse %s', (of, expected) => {
    expect(places(evaluateText(SHEET(`    tables: [{ of: ${of} }]`)))).toEqual([expected]);
  });
});

describe('figures', () => {
  const figure = (text: string): Block => block(SHEET(`    figures: [${text}]`), 'sections/1/figures/1');

  it('draw a line for each condition over the speed, with the limit', () => {
    expect(figure('{ kind: line, of: F, limit: 4 lbf, title: Force }')).toMatchObject({
      label: 'Force',
      unit: 'lbf',
      x: { name: 'speed', values: [1, 2, 3], unit: 'rpm' },
      series: [
        { label: 'C1', values: [1, 2, 3] },
        { label: 'C2', values: [2, 4, 6] },
      ],
      seriesAxis: 'condition',
      limit: { values: [4] },
      greatest: { at: 'C2, 3 rpm', printed: { number: '6.000' } },
    });
  });

  it('draw a spectrum over the orders, whichever axis is the inner one', () => {
    expect(
      figure('{ kind: spectrum, unit: mm, of: \'harmonics(2)*1 mm*at(N, "speed", 2 rpm)/(2 rpm)\' }'),
    ).toMatchObject({
      x: { name: 'harmonic', values: [1, 2] },
      series: [{ label: '', values: [1, 2] }],
    });
  });

  it.each([
    ['{ kind: spectrum, of: F }', 'FIGURE_AXES', 'it varies along `condition` and `speed`'],
    ['{ kind: line, of: L }', 'FIGURE_AXES', 'it is a single value'],
    ['{ kind: matrix, of: t }', 'FIGURE_AXES', 'it varies along `condition`'],
    ['{ kind: line, of: harmonics(3)*F }', 'FIGURE_AXES', 'bring one down'],
    ['{ kind: line, of: F, limit: L }', 'UNIT_MISMATCH', ''],
    ['{ kind: line, of: F, unit: mm }', 'UNIT_MISMATCH', ''],
    ['{ kind: bars, of: F }', 'SCHEMA_VALUE', 'allowed: line'],
  ])('refuse %s', (text, code, hint) => {
    const { report, diagnostics } = evaluateText(SHEET(`    figures: [${text}]`));
    expect(report).toBeNull();
    expect(diagnostics.map((diagnostic) => diagnostic.code)).toEqual([code]);
    expect(diagnostics[0]?.hints.join()).toContain(hint);
  });
});

describe('tables of the sheet', () => {
  it('are read on the straight line between their points: half way from 30 to 50', () => {
    expect(reportOf(evaluateText(SHEET())).quantities['r']?.value).toBeCloseTo(40, 12);
  });

  it.each([
    ['interpolate(k, 5)', 'LOOKUP_MISSING', 'it runs from 1.000 to 4.000'],
    ['interpolate(k, 0.5)', 'LOOKUP_MISSING', ''],
    ['interpolate(kk, 1)', 'NAME_UNKNOWN', 'did you mean `k`?'],
    ['interpolate(L, 1)', 'NAME_UNKNOWN', ''],
    ['interpolate(k, L)', 'UNIT_MISMATCH', ''],
    ['k + 1', 'EXPRESSION_NOT_ALLOWED', 'interpolate(k, x)'],
  ])('%s', (calc, code, hint) => {
    const { diagnostics } = evaluateText(SHEET(`  - { title: T, steps: { z: "${calc}" } }`));
    expect(diagnostics.map((diagnostic) => diagnostic.code)).toEqual([code]);
    expect(diagnostics[0]?.hints.join()).toContain(hint);
  });

  it('may be in gauge pressures, and say so where they end', () => {
    const text = sheetOf(
      'tables: { k: { columns: { p: psig, y: mm }, rows: [[1, 2], [3, 4]], source: b } }',
      'sections: [{ title: S, steps: { a: "interpolate(k, 9 psig)" } }]',
    );
    expect(evaluateText(text).diagnostics).toMatchObject([
      { code: 'LOOKUP_MISSING', message: 'the table `k` does not reach 9.000 psig' },
    ]);
  });

  it('must rise', () => {
    const text = SHEET().replace('[2, 30], [4, 50]', '[4, 30], [2, 50]');
    expect(places(evaluateText(text))).toEqual(['LOOKUP_ORDER 9:70']);
  });
});

describe('expected ranges', () => {
  const sheet = (expect: string): string =>
    sheetOf('inputs: { L: { value: 12 in, source: b, ' + `expect: ${expect} } }`);

  it('leave a value in them alone', () => {
    const evaluation = evaluateText(sheet('1 ft..2 ft'));
    expect(evaluation.diagnostics).toEqual([]);
    expect(reportOf(evaluation).sections[0]?.blocks[1]).toMatchObject({
      expect: { range: '1 ft..2 ft', within: true },
    });
  });

  it('warn of a value outside, which is still given', () => {
    const evaluation = evaluateText(sheet('2..3 ft'));
    expect(evaluation.diagnostics).toMatchObject([
      { code: 'UNEXPECTED', severity: 'warning', message: '`L` is 1.000 ft, outside of what is expected: 2..3 ft' },
    ]);
    expect(reportOf(evaluation).sections[0]?.blocks[1]).toMatchObject({ expect: { within: false } });
  });

  it.each([
    ['2..3 psi', 'UNIT_MISMATCH'],
    ['3..2 ft', 'QUANTITY_SYNTAX'],
    ['2 ft', 'QUANTITY_SYNTAX'],
  ])('refuse %s', (text, code) => {
    expect(evaluateText(sheet(text)).diagnostics.map((diagnostic) => diagnostic.code)).toEqual([code]);
  });
});
