import { describe, expect, it } from 'vitest';
import type { ExplainedBlock } from '../../core/report/explain.ts';
import { axesSheet, type AxesSheetParts } from '../core/report/axes-sheet.ts';
import { makeWorkplace, type Ended } from './harness.ts';

const { cli, write } = makeWorkplace();

async function explain(name: string, args: readonly string[] = [], parts: AxesSheetParts = {}): Promise<Ended> {
  await write('sheet.yaml', axesSheet(parts));
  return cli(['explain', 'sheet.yaml', name, ...args]);
}

describe('explain', () => {
  it('shows formula, numbers and result, and beneath them what they rest on', async () => {
    const { status, out, err } = await explain('dp_x');
    expect(status).toBe(0);
    // The sheet's warnings are not part of the answer.
    expect(err).toMatch(/^warning\[UNEXPECTED\]/);
    expect(out).toBe(
      [
        'dp_x = 10.00 psi',
        '│  = x*p',
        '│  = 10 % * 100.0 psia',
        '├─ x = 10 % · Pulsation',
        '│     tolerance ± 5 %',
        '│     source: Design basis',
        '└─ p = 85.3 psig · Line pressure',
        '   │  source: Design basis',
        '   └─ atmosphere = 14.7 psia · Atmospheric pressure',
        '',
      ].join('\n'),
    );
  });

  it('says which case the numbers are of, and where the others lie', async () => {
    const { out } = await explain('F');
    expect(out).toContain('│  = 60.00 psi * 30 in^2 (at C01)\n');
    expect(out).toContain('│  least 1500 lbf at C02, greatest 1800 lbf at C01\n');
    expect(out).toContain('│  △ outside of what is expected: 1600..1900 lbf\n');
  });

  it('explains a check by its label or path', async () => {
    const byLabel = await explain('Force');
    expect(byLabel.out).toMatch(
      /^F <= lim · Force\n│ {2}1800 lbf <= 1700 lbf \(at C01\)\n│ {2}1\.06 ▲ over\n│ {2}fails at 1 of 2\n/,
    );
    expect((await explain('sections/1/checks/1')).out).toBe(byLabel.out);
  });

  it('takes other values, one condition, and other units', async () => {
    expect((await explain('F', ['--set', 'A=20 in^2', '--condition', 'C02'])).out).toContain(
      '= 50.00 psi * 20 in^2 (at C02)',
    );
    // 30 × 25.4² mm² = 19354.8 mm².
    expect((await explain('A', ['--units', 'si'])).out).toMatch(/^A = 19355 mm\^2/);
  });

  it('shows a hold instead of a source', async () => {
    const inputs = { A: '{ value: 30 in^2, label: Area, hold: Awaiting the vendor }' };
    expect((await explain('F', [], { inputs })).out).toContain('◔ hold: Awaiting the vendor');
  });

  it('refers to what is shown above', async () => {
    const { out } = await explain('twice', [], { steps: { twice: 'F + F/2', thrice: 'twice + F' } });
    expect(out.match(/dp\*A/g)).toHaveLength(1);
    const thrice = await explain('thrice', [], { steps: { twice: 'F + F/2', thrice: 'twice + F' } });
    expect(thrice.out).toContain('└─ F = 1500 … 1800 lbf, shown above\n');
  });

  it('gives programs the tree with the blocks of the report', async () => {
    const { out } = await explain('dp_x', ['--format', 'json']);
    const { antinode, sheet, tree } = JSON.parse(out) as { antinode: string; sheet: unknown; tree: ExplainedBlock };
    expect(antinode).toBe('explanation/1');
    expect(sheet).toMatchObject({ number: 'T-002', digest: expect.stringMatching(/^sha256-/) as string });
    expect(tree).toMatchObject({ block: { block: 'step', name: 'dp_x' }, numbers: '10 % * 100.0 psia', shown: 'here' });
    expect(tree.uses.map(({ block }) => block.path)).toEqual(['inputs/x', 'inputs/p']);
  });

  it('is wrong usage for a name that is not there, with the nearest one', async () => {
    const { status, out, err } = await explain('dp_z');
    expect({ status, out }).toEqual({ status: 3, out: '' });
    expect(err).toContain('the sheet has no quantity and no check `dp_z`');
    expect(err).toContain('did you mean `dp_x`');
  });

  it('reports a wrong sheet as diagnostics', async () => {
    const wrong: AxesSheetParts = { steps: { w: '2*nothing' } };
    expect(await explain('F', [], wrong)).toMatchObject({
      status: 2,
      out: '',
      err: expect.stringContaining('nothing') as string,
    });
    const { out } = await explain('F', ['--format', 'json'], wrong);
    expect(JSON.parse(out)).toMatchObject({ antinode: 'diagnostics/1', diagnostics: [{ severity: 'error' }] });
  });

  it('lets nothing through that a terminal would obey', async () => {
    const { out } = await explain('A', [], { inputs: { A: '{ value: 30 in^2, label: "a\\e[31mb", source: basis }' } });
    expect(out).toContain('a<U+001B>[31mb');
  });
});
