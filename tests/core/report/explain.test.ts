import { describe, expect, it } from 'vitest';
import { explainBlock, MAX_DEPTH, type ExplainedBlock } from '../../../core/report/explain.ts';
import { axesSheet, reportOf, type AxesSheetParts } from './axes-sheet.ts';

function treeOf(name: string, parts: AxesSheetParts = {}): ExplainedBlock {
  const found = explainBlock(reportOf(axesSheet(parts)), name);
  if ('nearest' in found) throw new Error(`no ${name}`);
  return found.tree;
}

/** The tree as names: `F(dp A)`. */
function outline({ block, shown, uses }: ExplainedBlock): string {
  const name = block.path.split('/').at(-1) ?? '';
  const beneath = uses.length === 0 ? '' : `(${uses.map(outline).join(' ')})`;
  return `${name}${shown === 'here' ? '' : `:${shown}`}${beneath}`;
}

const GASES = ['gases: { lean: { method: ideal, fractions: { methane: 100 % }, source: basis } }'];

describe('explainBlock', () => {
  it('goes back to inputs, columns and the atmosphere', () => {
    expect(outline(treeOf('F'))).toBe('F(dp A)');
    expect(outline(treeOf('dp_x'))).toBe('dp_x(x p(atmosphere))');
  });

  it('goes back to gases and tables', () => {
    const parts: AxesSheetParts = {
      top: [...GASES, 'tables: { loss: { columns: { b: "1", K: "1" }, rows: [[0, 1], [1, 3]], source: basis } }'],
      steps: { M: 'molar_mass(lean)', K: 'interpolate(loss, 0.5)' },
    };
    expect(outline(treeOf('M', parts))).toBe('M(lean)');
    expect(outline(treeOf('K', parts))).toBe('K(loss)');
  });

  it('shows a block once, and refers to it afterwards', () => {
    const steps = { a: 'x*p to psi', b: 'a + x*p to psi' };
    expect(outline(treeOf('b', { steps }))).toBe('b(a(x p(atmosphere)) x:above p:above)');
  });

  it('puts numbers in, in the case that the block names, gauge readings as absolute', () => {
    expect(treeOf('F').numbers).toBe('60.00 psi * 30 in^2');
    expect(treeOf('dp_x').numbers).toBe('10 % * 100.0 psia');
    expect(treeOf('sections/1/checks/1').numbers).toBe('1800 lbf <= 1700 lbf');
  });

  it.each([
    ['A^2 to in^4', '(30 in^2)^2'],
    ['A² to in^4', '(30 in^2)²'],
    ['lim/A to psi', '(1700 lbf)/(30 in^2)'],
    ['-lim + 2*lim', '-1700 lbf + 2 * 1700 lbf'],
    ['lim - F', '1700 lbf - 1500 lbf'],
    ['max_over(F, "condition")', 'max_over(1500 … 1800 lbf, "condition")'],
    ['2*max_over(dp, "condition")', '2 * max_over(50.00 … 60.00 psi, "condition")'],
    ['pi*A', 'pi * 30 in^2'],
  ])('writes `%s` so that it reads as it computes', (calc, numbers) => {
    expect(treeOf('q', { steps: { q: `{ calc: '${calc}' }` } }).numbers).toBe(numbers);
  });

  it('finds a check by its path, label or demand', () => {
    const path = 'sections/1/checks/1';
    for (const name of [path, 'Force', 'F <= lim']) expect(treeOf(name).block.path).toBe(path);
  });

  it('takes a name before a label', () => {
    const steps = { Area: '{ calc: 2*A, label: Twice }' };
    expect(treeOf('Area', { steps }).block.path).toBe('sections/1/steps/Area');
    expect(treeOf('Area').block.path).toBe('inputs/A');
  });

  it('says what is near a name that is not there', () => {
    const report = reportOf(axesSheet());
    expect(explainBlock(report, 'dp_y')).toEqual({ nearest: ['dp_x'] });
    expect(explainBlock(report, 'constructor')).toEqual({ nearest: [] });
  });

  it('ends a long chain, and says where it goes on', () => {
    const chain = Object.fromEntries(
      Array.from({ length: MAX_DEPTH + 5 }, (_, i) => [`s${i + 1}`, i === 0 ? '2*A' : `1*s${i}`]),
    );
    let node: ExplainedBlock | undefined = treeOf(`s${MAX_DEPTH + 5}`, { steps: chain });
    let depth = 0;
    while (node?.uses[0] !== undefined) [node, depth] = [node.uses[0], depth + 1];
    expect(node?.shown).toBe('deeper');
    expect(depth).toBe(MAX_DEPTH);
  });
});
