import { AXIS_FUNCTIONS } from './axis-functions.ts';
import { MATHEMATICS } from './mathematics.ts';

/** True for functions that every sheet knows, whatever the library offers. */
export function isBuiltIn(name: string): boolean {
  return MATHEMATICS.has(name) || AXIS_FUNCTIONS.has(name);
}

export const BUILT_IN_NAMES: readonly string[] = [...MATHEMATICS.keys(), ...AXIS_FUNCTIONS.keys()];
