import { describe, expect, it } from 'vitest';
import { judge } from '../../../core/evaluate/judge-check.ts';

describe('judge', () => {
  it.each([
    ['<=', 575, 610, true, 575 / 610],
    ['<=', 610, 610, true, 1],
    ['<', 610, 610, false, 1],
    ['<=', 611, 610, false, 611 / 610],
    ['>=', 0.2, 0.1, true, 0.5],
    ['>=', 0.05, 0.1, false, 2],
    ['>', 3, 3, false, 1],
    ['<=', 0, 610, true, 0],
  ] as const)('%s: %d against %d', (operator, left, right, passes, utilisation) => {
    expect(judge(operator, left, right)).toEqual({ passes, utilisation });
  });

  it('takes 0.1 + 0.2 as at a limit of 0.3', () => {
    expect(judge('<=', 0.1 + 0.2, 0.3).passes).toBe(true);
    expect(judge('<', 0.1 + 0.2, 0.3).passes).toBe(false);
  });

  it('gives no ratio where there is none', () => {
    expect(judge('<=', 5, 0).utilisation).toBeNull();
    expect(judge('<=', -5, 10).utilisation).toBeNull();
    expect(judge('>=', -5, 10)).toEqual({ passes: false, utilisation: null });
  });

  it('keeps 1.00 at the limit below zero', () => {
    expect(judge('<=', -20, -10)).toEqual({ passes: true, utilisation: 0.5 });
    expect(judge('<=', -5, -10)).toEqual({ passes: false, utilisation: 2 });
    expect(judge('>=', -5, -10)).toEqual({ passes: true, utilisation: 0.5 });
  });
});
