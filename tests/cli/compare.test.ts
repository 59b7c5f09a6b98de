import { describe, expect, it } from 'vitest';
import type { Comparison } from '../../core/report/comparison.ts';
import { axesSheet, type AxesSheetParts } from '../core/report/axes-sheet.ts';
import { makeWorkplace, type Ended } from './harness.ts';

const { cli, write } = makeWorkplace();

async function compare(before: AxesSheetParts, after: AxesSheetParts, ...args: string[]): Promise<Ended> {
  await write('before.yaml', axesSheet(before));
  await write('after.yaml', axesSheet(after));
  return cli(['compare', 'before.yaml', 'after.yaml', ...args]);
}

const input = (value: string, label: string): string => `{ value: ${value}, label: ${label}, source: basis }`;

/** The limit falls below the force, the line pressure rises by 15 psi from 100 psia, and the force is halved in the text. */
const BEFORE: AxesSheetParts = { inputs: { lim: input('2500 lbf', 'Limit') } };
const AFTER: AxesSheetParts = {
  inputs: { lim: input('1700 lbf', 'Limit'), p: input('100.3 psig', 'Line pressure') },
  steps: { dp_x: '{ calc: 2*x*p, unit: psi }', extra: '2*A' },
};

describe('compare', () => {
  it('says what fails now, then what changed', async () => {
    const { status, out, err } = await compare(BEFORE, AFTER);
    expect({ status, err }).toEqual({ status: 0, err: '' });
    expect(out).toBe(
      [
        'T-002  Force at two conditions',
        '',
        'Newly failing',
        '   Force: 0.72 at C01 → 1.06 at C01 (1 of 2 fail) ▲ over',
        '',
        'Inputs',
        '   p, Line pressure: 85.3 psig → 100.3 psig (+15 psi, +15 % of the absolute value)',
        '   lim, Limit: 2500 lbf → 1700 lbf (-32 %)',
        '',
        'Formulas',
        '   dp_x: x*p → 2*x*p',
        '',
        'Results',
        // 10 % of 100 psia; then twice 10 % of 115 psia.
        '   dp_x: 10.00 psi → 23.00 psi (+130 %), formula changed',
        '',
        'Added',
        '   step extra',
        '',
        '6 blocks unchanged · 1 block affected by what changed',
        '',
      ].join('\n'),
    );
  });

  it('says where a result over axes changed most', async () => {
    // 65 × 30 = 1950 lbf at C02, where it was 1500 lbf.
    const { out } = await compare({}, { rows: ['C01: [61, all]', 'C02: [65, half]'] });
    expect(out).toContain('F: 1500 lbf → 1950 lbf (+30 %) at C02\n');
    expect(out).toContain('dp, Differential pressure: C01 60 psi → 61 psi, C02 50 psi → 65 psi');
  });

  it('says that nothing changed', async () => {
    const { status, out } = await compare({}, {});
    expect(status).toBe(0);
    expect(out).toBe('T-002  Force at two conditions\n\nno change: 10 blocks with equal digests\n');
  });

  it('gives programs the comparison', async () => {
    const { out, status } = await compare(BEFORE, AFTER, '--format', 'json');
    const comparison = JSON.parse(out) as Comparison;
    expect(status).toBe(0);
    expect(comparison).toMatchObject({
      antinode: 'comparison/1',
      before: { number: 'T-002' },
      newlyFailing: [{ label: 'Force' }],
      unchanged: 6,
    });
  });

  it('is status 2 when either sheet is wrong, and names the file', async () => {
    const wrong: AxesSheetParts = { steps: { w: '2*nothing' } };
    for (const [a, b, file] of [
      [wrong, {}, 'before.yaml'],
      [{}, wrong, 'after.yaml'],
    ] as const) {
      const { status, out, err } = await compare(a, b);
      expect({ status, out }).toEqual({ status: 2, out: '' });
      expect(err).toContain(`--> ${file}:`);
    }
    const { out } = await compare(wrong, {}, '--format', 'json');
    expect(JSON.parse(out)).toMatchObject({ antinode: 'diagnostics/1', diagnostics: [{ file: 'before.yaml' }] });
  });

  it('is status 3 without two files', async () => {
    expect((await cli(['compare', 'before.yaml'])).status).toBe(3);
  });
});
