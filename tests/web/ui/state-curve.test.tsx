import { cleanup, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';
import type { State } from '../../../schemas/api.ts';
import { curveShape } from '../../../web/ui/curve-shape.ts';
import { StateCurve } from '../../../web/ui/state-curve.tsx';

afterEach(cleanup);

const STATES: readonly State[] = ['pushed', 'in check', 'checked', 'approved', 'returned'];

describe('curveShape', () => {
  it('reaches one node more with each step forward', () => {
    expect((['pushed', 'checked', 'approved'] as const).map((state) => curveShape(state).reached)).toEqual([0, 1, 2]);
  });

  it('swings one lobe at most, the first that is not done', () => {
    for (const state of STATES) {
      const { lobes } = curveShape(state);
      expect(lobes.filter((lobe) => lobe === 'swinging').length).toBeLessThanOrEqual(1);
      expect(lobes.lastIndexOf('done')).toBeLessThan(lobes.findIndex((lobe) => lobe !== 'done'));
    }
    expect(curveShape('checked').lobes).toEqual(['done', 'swinging', 'ahead']);
  });
});

describe('StateCurve', () => {
  it('says its state to those who do not see it', () => {
    for (const state of STATES) {
      render(<StateCurve state={state} />);
      expect(screen.getByRole('img', { name: `State: ${curveShape(state).words}` })).toBeDefined();
      cleanup();
    }
  });

  it('has four nodes, and swings only while something is in progress', () => {
    const { container, rerender } = render(<StateCurve state="in check" />);
    expect(container.querySelectorAll('circle')).toHaveLength(4);
    expect(container.querySelectorAll('.swing')).toHaveLength(1);
    rerender(<StateCurve state="approved" />);
    expect(container.querySelectorAll('.swing')).toHaveLength(0);
  });
});
