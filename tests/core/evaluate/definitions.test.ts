import { describe, expect, it } from 'vitest';
import { evaluateText, places, reportOf } from './sheet-text.ts';

const SHEET = [
  'antinode: sheet/1',
  'number: T-1',
  'title: Test',
  'units: us',
  'use: [basis.yaml, shared/gas.yaml]',
  'sections: [{ title: S, steps: { d: "p - 100 psig to psi", M: "molar_mass(g)" } }]',
].join('\n');

const BASIS = [
  'antinode: definitions/1',
  'atmosphere: 14.7 psia',
  'sources: { b: Basis }',
  'assumptions: [One]',
  'inputs: { p: { value: 120 psig, source: b } }',
].join('\n');

const GAS = ['antinode: definitions/1', 'gases: { g: { method: ideal, fractions: { methane: 100 % } } }'].join('\n');
const BESIDE = { 'basis.yaml': BASIS, 'shared/gas.yaml': GAS };

describe('definitions of used files', () => {
  const report = reportOf(evaluateText(SHEET, {}, BESIDE));

  it('count as the sheet’s own', () => {
    expect(report.quantities['d']?.value).toBeCloseTo(20, 10);
    // CH4 by the table of atomic masses in core/gas/data: 16.04246 g/mol within its digits.
    expect(report.quantities['M']?.si).toBeCloseTo(0.0160425, 6);
    expect(report.sections.map(({ path }) => path)).toEqual(['inputs', 'gases', 'assumptions', 'sections/1']);
  });

  it('keep their place', () => {
    const blocks = report.sections.flatMap(({ blocks }) => blocks);
    expect(blocks.find(({ path }) => path === 'inputs/p')?.place).toEqual({ file: 'basis.yaml', line: 5 });
    expect(blocks.find(({ path }) => path === 'gases/g')?.place).toEqual({ file: 'shared/gas.yaml', line: 2 });
  });
});

describe('conflicts name both places', () => {
  it.each([
    ['an input', 'inputs: { p: { value: 130 psig, source: b } }', 'NAME_DUPLICATE', 'basis.yaml', 5],
    ['the atmosphere', 'atmosphere: 14.7 psia', 'NAME_DUPLICATE', 'basis.yaml', 2],
    ['a source', 'sources: { b: Other }', 'NAME_DUPLICATE', 'basis.yaml', 3],
    ['a gas', 'gases: { g: { method: ideal, fractions: { ethane: 100 % } } }', 'NAME_DUPLICATE', 'shared/gas.yaml', 2],
  ])('%s', (_, line, code, file, at) => {
    const { diagnostics } = evaluateText(`${SHEET}\n${line}`, {}, BESIDE);
    expect(diagnostics).toMatchObject([{ code, file: 's.yaml', line: 7, labels: [{ file, line: at }] }]);
  });
});

describe('used files that cannot be used', () => {
  it.each([
    ['absent', { 'shared/gas.yaml': GAS }, 'FILE_NOT_FOUND 5:7'],
    ['not a mapping', { ...BESIDE, 'basis.yaml': '- a' }, 'SCHEMA_TYPE 1:1'],
    ['a sheet', { ...BESIDE, 'basis.yaml': SHEET }, 'SCHEMA_VALUE 1:11'],
    ['with sections', { ...BESIDE, 'basis.yaml': `${BASIS}\nsections: []` }, 'SCHEMA_UNKNOWN_KEY 6:1'],
    ['with a fault', { ...BESIDE, 'basis.yaml': BASIS.replace('120 psig', '120 psj') }, 'UNIT_UNKNOWN 5:27'],
  ])('%s', (_, beside, expected) => {
    expect(places(evaluateText(SHEET, {}, beside as Record<string, string>))).toContain(expected);
  });
});
