import type { State } from '../../schemas/api.ts';

/** How one lobe of the curve is drawn: `done` still, `swinging` in progress, `broken` given back, `ahead` not begun. */
export type Lobe = 'done' | 'swinging' | 'broken' | 'ahead';

export interface CurveShape {
  /** Index of the last node that is reached. */
  readonly reached: 0 | 1 | 2 | 3;
  readonly lobes: readonly [Lobe, Lobe, Lobe];
  /** The state in words. */
  readonly words: string;
}

export const NODES = ['pushed', 'checked', 'approved', 'issued'] as const;

const SHAPES: Readonly<Record<State, CurveShape>> = {
  pushed: { reached: 0, lobes: ['ahead', 'ahead', 'ahead'], words: 'pushed, not yet handed over for checking' },
  'in check': { reached: 0, lobes: ['swinging', 'ahead', 'ahead'], words: 'in check' },
  returned: { reached: 0, lobes: ['broken', 'ahead', 'ahead'], words: 'returned to the author' },
  checked: { reached: 1, lobes: ['done', 'swinging', 'ahead'], words: 'checked, waits for approval' },
  approved: { reached: 2, lobes: ['done', 'done', 'ahead'], words: 'approved' },
};

export function curveShape(state: State): CurveShape {
  return SHAPES[state];
}
