/** Parts of a sheet that a test puts in; what it leaves out stays as in a small sheet without a fault. */
export interface SheetParts {
  readonly inputs?: readonly string[];
  readonly steps?: readonly string[];
  readonly checks?: readonly string[];
  /** Whole lines at the top level, after the units. */
  readonly top?: readonly string[];
}

/**
 * A small sheet: force of a differential pressure on the bore of a pipe. At 60 psi and 6 in it is 1696.46 lbf, which
 * passes the check against 2000 lbf with a utilisation of 0.85.
 */
export function sheetText({ inputs = [], steps = [], checks = [], top = [] }: SheetParts = {}): string {
  return [
    'antinode: sheet/1',
    'number: T-001',
    'title: Force on a bore',
    'units: us',
    'atmosphere: 14.7 psia',
    ...top,
    'sources:',
    '  basis: Design basis',
    'inputs:',
    '  p: { value: 900 psig, label: Line pressure, source: basis }',
    '  dp: { value: 60 psi, label: Differential pressure, source: basis }',
    '  D: { value: 6 in, label: Bore, source: basis }',
    '  F_lim: { value: 2000 lbf, label: Limit, source: basis }',
    ...inputs.map((line) => `  ${line}`),
    'sections:',
    '  - title: Force',
    '    steps:',
    '      A: pi/4*D^2 to in^2',
    '      F: { calc: dp*A to lbf, label: Force on the bore }',
    ...steps.map((line) => `      ${line}`),
    '    checks:',
    '      - { that: F <= F_lim, label: Force below its limit, source: basis }',
    ...checks.map((line) => `      - ${line}`),
    '',
  ].join('\n');
}
