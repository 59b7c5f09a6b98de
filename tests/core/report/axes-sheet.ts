import { evaluateSheet } from '../../../core/evaluate/evaluate-sheet.ts';
import type { Report } from '../../../core/report/model.ts';

/** Parts of the sheet that a test puts in the place of its own. */
export interface AxesSheetParts {
  readonly rows?: readonly string[];
  readonly inputs?: Readonly<Record<string, string>>;
  readonly steps?: Readonly<Record<string, string>>;
  readonly checks?: readonly string[];
  /** Whole lines at the top level. */
  readonly top?: readonly string[];
  /** Whole lines in the first section, before its checks. */
  readonly section?: readonly string[];
}

const INPUTS: Readonly<Record<string, string>> = {
  A: '{ value: 30 in^2, label: Area, source: basis }',
  p: '{ value: 85.3 psig, label: Line pressure, source: basis }',
  x: '{ value: 10 %, label: Pulsation, source: basis, tolerance: 5 % }',
  lim: '{ value: 1700 lbf, label: Limit, source: basis }',
};

const STEPS: Readonly<Record<string, string>> = {
  F: '{ calc: dp*A, unit: lbf, expect: 1600..1900 lbf }',
  dp_x: '{ calc: x*p, unit: psi }',
};

/**
 * Force of a differential pressure on an area, at two operating conditions. By hand: F = 60 psi × 30 in² = 1800 lbf at
 * C01 and 50 × 30 = 1500 lbf at C02; dp_x = 10 % of (85.3 + 14.7) psia = 10 psi; utilisation 1800/1700 = 1.06 at C01.
 */
export function axesSheet(parts: AxesSheetParts = {}): string {
  const { rows = ['C01: [60, all]', 'C02: [50, half]'], checks = ['{ that: F <= lim, label: Force }'] } = parts;
  const entries = (all: Readonly<Record<string, string>>, indent: string): string[] =>
    Object.entries(all).flatMap(([name, text]) => (text === '' ? [] : [`${indent}${name}: ${text}`]));
  return [
    'antinode: sheet/1',
    'number: T-002',
    'title: Force at two conditions',
    'units: us',
    'atmosphere: 14.7 psia',
    'sources:',
    '  basis: Design basis',
    ...(parts.top ?? []),
    'conditions:',
    '  source: basis',
    '  columns:',
    '    dp: { unit: psi, label: Differential pressure }',
    '    loading: text',
    '  rows:',
    ...rows.map((row) => `    ${row}`),
    'inputs:',
    ...entries({ ...INPUTS, ...parts.inputs }, '  '),
    'sections:',
    '  - title: Force',
    '    steps:',
    ...entries({ ...STEPS, ...parts.steps }, '      '),
    ...(parts.section ?? []).map((line) => `    ${line}`),
    ...(checks.length === 0 ? [] : ['    checks:']),
    ...checks.map((check) => `      - ${check}`),
    '',
  ].join('\n');
}

/** The report of a sheet that must have no error. */
export function reportOf(text: string): Report {
  const { report, diagnostics } = evaluateSheet({ entry: 'sheet.yaml', files: [{ name: 'sheet.yaml', text }] });
  if (report === null) throw new Error(diagnostics.map(({ message }) => message).join('\n'));
  return report;
}
