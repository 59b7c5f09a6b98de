import type { Shape } from '../axes/shape.ts';
import type { GasModel } from '../gas/gas-model.ts';

/** A gas by name: one mixture, or one for each operating condition. */
export interface GasColumn {
  readonly axes: Shape;
  readonly models: readonly GasModel[];
}
