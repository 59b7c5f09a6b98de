import { ACOUSTICS_FUNCTIONS } from './acoustics.ts';
import type { LibraryFunction } from './function.ts';
import { GAS_FUNCTIONS } from './gas.ts';
import { LIMITS_FUNCTIONS } from './limits.ts';
import { PIPE_FUNCTIONS } from './pipe.ts';

/** Every physics function that sheets may call, by name. */
export const LIBRARY: ReadonlyMap<string, LibraryFunction> = new Map(
  [...PIPE_FUNCTIONS, ...GAS_FUNCTIONS, ...ACOUSTICS_FUNCTIONS, ...LIMITS_FUNCTIONS].map((fn) => [fn.name, fn]),
);
