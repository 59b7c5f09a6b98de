import { describe, expect, it } from 'vitest';
import { makeWorkplace } from './harness.ts';

const { cli, write } = makeWorkplace();

const SHEET = [
  'antinode: sheet/1',
  'number: T-1',
  'title: Product',
  'units: us',
  'sources: { b: Basis }',
  'inputs:',
  '  x: { value: 10 in, label: Width, source: b, tolerance: 10 % }',
  '  y: { value: 5 in, label: Height, source: b, range: [4 in, 7 in] }',
  'sections: [{ title: S, checks: [{ that: x*y <= 70 in^2, label: Area }] }]',
].join('\n');

describe('run --sensitivity', () => {
  it('ranks the inputs and gives the band, by hand: 50/70, 36/70 and 77/70', async () => {
    await write('sheet.yaml', SHEET);
    const { status, out } = await cli(['run', 'sheet.yaml', '--sensitivity']);
    expect(status).toBe(0);
    const lines = out
      .slice(out.indexOf('What drives the checks'))
      .split('\n')
      .map((line) => line.trim());
    expect(lines.slice(2, 6)).toEqual([
      'Area  0.714',
      'Height  4.000 in … 7.000 in  0.571 to 1.000',
      'Width   9.000 in … 11.00 in  0.643 to 0.786',
      '0.514 to 1.100 at the corners: over the limit at the worst; ± 0.357 added up, ± 0.295 as independent, to first order',
    ]);
  });

  it('is the same for machines', async () => {
    await write('sheet.yaml', SHEET);
    const { out } = await cli(['run', 'sheet.yaml', '--sensitivity', '--format', 'json']);
    const { sensitivity } = JSON.parse(out) as { sensitivity: readonly unknown[] };
    expect(sensitivity).toMatchObject([{ label: 'Area', effects: [{ path: 'inputs/y' }, { path: 'inputs/x' }] }]);
  });

  it('says so where nothing is uncertain', async () => {
    await write('plain.yaml', SHEET.replace(', tolerance: 10 %', '').replace(', range: [4 in, 7 in]', ''));
    expect((await cli(['run', 'plain.yaml', '--sensitivity'])).out).toContain('Nothing in this sheet is uncertain');
  });

  it('is refused in forms that have no place for it', async () => {
    expect((await cli(['run', 'sheet.yaml', '--sensitivity', '--format', 'csv'])).status).toBe(3);
  });
});
