import { describe, expect, it } from 'vitest';
import { compareRevisions } from '../../../core/report/compare-revisions.ts';
import type { Comparison } from '../../../core/report/comparison.ts';
import { axesSheet, reportOf, type AxesSheetParts } from './axes-sheet.ts';

function compared(before: AxesSheetParts, after: AxesSheetParts): Comparison {
  return compareRevisions(reportOf(axesSheet(before)), reportOf(axesSheet(after)));
}

const names = (mentions: Comparison['affected']): string[] => mentions.map(({ name, path }) => name ?? path);

describe('compareRevisions', () => {
  it('finds nothing between a sheet and itself', () => {
    const { newlyFailing, checks, holds, axes, inputs, formulas, results, added, removed, texts, affected, unchanged } =
      compared({}, {});
    expect([newlyFailing, checks, axes, inputs, formulas, results, added, removed, texts, affected].flat()).toEqual([]);
    expect(holds).toEqual({ opened: [], closed: [] });
    // Atmosphere, four inputs, two columns, two steps and one check.
    expect(unchanged).toBe(10);
  });

  it('tells an input that changed from what it affects', () => {
    // F = 60 × 33 = 1980 lbf: 180/1800 = 10 % more; utilisation 1980/1700 = 1.1647.
    const { inputs, results, affected, checks, unchanged } = compared(
      {},
      { inputs: { A: '{ value: 33 in^2, label: Area, source: basis }' } },
    );
    expect(inputs).toMatchObject([
      { name: 'A', before: '30 in^2', after: '33 in^2', change: { relative: expect.closeTo(0.1, 12) as number } },
    ]);
    expect(results).toMatchObject([
      {
        name: 'F',
        cause: 'affected',
        change: { before: '1800 lbf', after: '1980 lbf', at: 'C01', relative: expect.closeTo(0.1, 12) as number },
      },
    ]);
    expect(names(affected)).toEqual(['F', 'F <= lim']);
    expect(checks).toMatchObject([
      {
        before: { utilisation: expect.closeTo(1800 / 1700, 9) as number },
        after: { utilisation: expect.closeTo(1980 / 1700, 9) as number },
      },
    ]);
    expect(unchanged).toBe(7);
  });

  it('puts checks that newly fail apart, new ones among them', () => {
    const before = { inputs: { lim: '{ value: 1900 lbf, label: Limit, source: basis }' } };
    const after = { checks: ['{ that: F <= lim, label: Force }', '{ that: F >= 1600 lbf, label: Least force }'] };
    const { newlyFailing, checks, added } = compared(before, after);
    expect(newlyFailing).toMatchObject([
      {
        label: 'Force',
        before: { status: 'pass' },
        after: { status: 'fail', at: 'C01', points: { all: 2, failed: 1 } },
      },
      { label: 'Least force', before: null, after: { status: 'fail', at: 'C02' } },
    ]);
    expect(checks).toEqual([]);
    expect(names(added)).toEqual(['F >= 1600 lbf']);
  });

  it('lists a check that passes again among the changed ones', () => {
    const { newlyFailing, checks } = compared(
      {},
      { inputs: { lim: '{ value: 1950 lbf, label: Limit, source: basis }' } },
    );
    expect(newlyFailing).toEqual([]);
    expect(checks).toMatchObject([{ before: { status: 'fail' }, after: { status: 'pass', standing: 'close' } }]);
  });

  it('measures a level by its difference, and by its share of the absolute level', () => {
    // 85.3 psig is 100 psia; 15 psi more is 15 % of that, not 15/85.3.
    const { inputs } = compared({}, { inputs: { p: '{ value: 100.3 psig, label: Line pressure, source: basis }' } });
    expect(inputs).toMatchObject([
      {
        before: '85.3 psig',
        after: '100.3 psig',
        change: { difference: '+15 psi', relative: expect.closeTo(0.15, 9) as number },
      },
    ]);
  });

  it('measures a temperature in degrees, not in shares of the scale it is read on', () => {
    // 0 °C to 10 °C: 10/273.15 = 3.66 % of the absolute temperature.
    const at = (value: string): AxesSheetParts => ({ inputs: { T: `{ value: ${value}, source: basis }` } });
    const [change] = compared(at('0 degC'), at('10 degC')).inputs;
    expect(change?.change).toMatchObject({
      difference: '+10 delta_degC',
      relative: expect.closeTo(10 / 273.15, 9) as number,
    });
  });

  it('measures a percentage in points as well', () => {
    const { inputs } = compared(
      {},
      { inputs: { x: '{ value: 12 %, label: Pulsation, source: basis, tolerance: 5 % }' } },
    );
    expect(inputs).toMatchObject([{ change: { difference: '+2 points', relative: expect.closeTo(0.2, 9) as number } }]);
  });

  it('gives no ratio from zero, nor across it', () => {
    const at = (value: string): AxesSheetParts => ({ inputs: { y: `{ value: ${value}, source: basis }` } });
    for (const [from, to] of [
      ['0 in', '2 in'],
      ['-1 in', '1 in'],
    ] as const)
      expect(compared(at(from), at(to)).inputs).toMatchObject([{ name: 'y', change: { relative: null } }]);
  });

  it('says in which operating condition a column changed', () => {
    const { inputs, results } = compared({}, { rows: ['C01: [60, all]', 'C02: [65, all]'] });
    expect(inputs).toMatchObject([
      { name: 'dp', parts: [{ part: 'C02', before: '50 psi', after: '65 psi' }] },
      { name: 'loading', change: null, parts: [{ part: 'C02', before: 'half', after: 'all' }] },
    ]);
    // 65 × 30 = 1950 lbf, 30 % over 1500 lbf.
    expect(results).toMatchObject([
      { change: { at: 'C02', after: '1950 lbf', relative: expect.closeTo(0.3, 9) as number } },
    ]);
  });

  it('compares at the points that both have, whatever their order', () => {
    const { axes, results, inputs } = compared({}, { rows: ['C03: [80, all]', 'C02: [50, half]', 'C01: [66, all]'] });
    expect(axes).toEqual([{ name: 'condition', added: ['C03'], removed: [] }]);
    expect(results).toMatchObject([{ change: { at: 'C01', before: '1800 lbf', after: '1980 lbf' } }]);
    expect(inputs[0]?.parts).toEqual([
      { part: 'C01', before: '60 psi', after: '66 psi' },
      { part: 'C03', before: '–', after: '80 psi' },
    ]);
  });

  it('tells a formula that changed from one that reads what changed', () => {
    const { formulas, results, affected } = compared(
      {},
      { steps: { F: '{ calc: 2*dp*A, unit: lbf, expect: 1600..1900 lbf }' } },
    );
    expect(formulas).toMatchObject([{ name: 'F', before: 'dp*A', after: '2*dp*A' }]);
    expect(results).toMatchObject([
      { name: 'F', cause: 'formula', change: { relative: expect.closeTo(1, 12) as number } },
    ]);
    expect(names(affected)).toEqual(['F <= lim']);
  });

  it('follows a step into another section', () => {
    const moved = (text: string): string =>
      text.replace('  - title: Force', '  - title: First\n    text: Words.\n  - title: Force');
    const { added, removed, affected, results } = compareRevisions(reportOf(axesSheet()), reportOf(moved(axesSheet())));
    expect(added.map(({ path }) => path)).toEqual(['sections/1/text']);
    expect([...removed, ...affected, ...results]).toEqual([]);
  });

  it('tells holds that are opened and closed', () => {
    const held = { inputs: { A: '{ value: 30 in^2, label: Area, hold: Awaiting the vendor }' } };
    const opened = compared({}, held);
    expect(opened.holds).toMatchObject({ opened: [{ name: 'A', reason: 'Awaiting the vendor' }], closed: [] });
    expect(opened.inputs).toEqual([]);
    expect(opened.texts).toMatchObject([{ name: 'A', what: 'source', before: 'Design basis', after: '' }]);
    expect(compared(held, {}).holds).toMatchObject({ opened: [], closed: [{ name: 'A' }] });
  });

  it('tells words that changed by what they are', () => {
    const inputs = { A: '{ value: 30 in^2, label: Bore, note: Measured, source: basis }' };
    const { texts } = compared({}, { inputs });
    expect(texts.map(({ what, before, after }) => [what, before, after])).toEqual([
      ['label', 'Area', 'Bore'],
      ['note', '', 'Measured'],
    ]);
  });

  it('does not take prose for changed where only the values in it are others', () => {
    const prose = { section: ['text: The area is {{ A }} here.'] };
    const other = { ...prose, inputs: { A: '{ value: 33 in^2, label: Area, source: basis }' } };
    const { texts, affected } = compared(prose, other);
    expect(texts).toEqual([]);
    expect(affected.map(({ path }) => path)).toContain('sections/1/text');
    expect(compared(prose, { section: ['text: The area was {{ A }} here.'] }).texts).toMatchObject([
      { path: 'sections/1/text', what: 'text' },
    ]);
  });

  it('tells a change that the report does not spell out', () => {
    const { texts, affected } = compared(
      {},
      { inputs: { lim: '{ value: 1700 lbf, label: Limit, source: basis, digits: 2 }' } },
    );
    expect(texts).toMatchObject([{ name: 'lim', what: 'form' }]);
    expect(names(affected)).toEqual(['F <= lim']);
  });

  it('lists gases and tables part by part', () => {
    const at = (ethane: number, K: number): AxesSheetParts => ({
      top: [
        `gases: { lean: { method: ideal, fractions: { methane: ${100 - ethane} %, ethane: ${ethane} % }, source: basis } }`,
        `tables: { loss: { columns: { b: "1", K: "1" }, rows: [[0, 1], [1, ${K}]], source: basis } }`,
      ],
    });
    expect(compared(at(10, 3), at(12, 4)).inputs.map(({ name, parts }) => [name, parts])).toEqual([
      [
        'lean',
        [
          { part: 'methane', before: '90 %', after: '88 %' },
          { part: 'ethane', before: '10 %', after: '12 %' },
        ],
      ],
      ['loss', [{ part: '1', before: '3', after: '4' }]],
    ]);
  });
});
