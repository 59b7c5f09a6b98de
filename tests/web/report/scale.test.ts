import { describe, expect, it } from 'vitest';
import { extent, ticks, tickText } from '../../../web/report/scale.ts';

describe('ticks', () => {
  it.each([
    [0, 100, 5, [0, 20, 40, 60, 80, 100]],
    [600, 1200, 7, [600, 700, 800, 900, 1000, 1100, 1200]],
    [-0.3, 0.31, 4, [-0.2, 0, 0.2]],
    [5, 5, 4, [5]],
  ])('from %d to %d', (from, to, about, expected) => {
    expect(ticks(from, to, about).map((tick) => Number(tick.toPrecision(12)))).toEqual(expected);
  });

  it('are written without the noise of their steps, with a minus sign', () => {
    expect([0.1 + 0.2, -1500].map(tickText)).toEqual(['0.3', '−1500']);
  });
});

describe('the extent of a drawing', () => {
  it('begins at zero where the values begin near it, and has room above', () => {
    expect(extent([10, 90])).toEqual([0, 93.6]);
    expect(extent([80, 90])[0]).toBe(80);
    expect(extent([0, 0])).toEqual([0, 1.04]);
  });
});
